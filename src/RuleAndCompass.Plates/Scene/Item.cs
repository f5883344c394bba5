using System.Collections.Immutable;

namespace RuleAndCompass.Plates.Scene;

/// <summary>What a thing on a page is for; tests and writers of other formats tell things apart by it.</summary>
public enum Role
{
    /// <summary>The edge of the stock, of the board, of the drawing.</summary>
    Frame,

    /// <summary>Work of earlier plates.</summary>
    Earlier,

    /// <summary>Work of this plate.</summary>
    Present,

    /// <summary>What the finished piece shows.</summary>
    Kept,

    /// <summary>What the hand does now.</summary>
    Now,

    /// <summary>A mark to prick through.</summary>
    Prick,

    /// <summary>A bar to measure.</summary>
    CheckBar,

    /// <summary>A small picture of a stage.</summary>
    Thumbnail,

    /// <summary>The name of a figure.</summary>
    Name,

    /// <summary>A text on the finished piece.</summary>
    Lettering,

    /// <summary>Sentences, titles and notes.</summary>
    Text,
}

/// <summary>The few colours of a plate. Each has its own grey, and none says anything that shape or width does not say too.</summary>
public enum Ink
{
    /// <summary>Near-black.</summary>
    Black,

    /// <summary>Mid-grey.</summary>
    Grey,

    /// <summary>Oxide red, dark grey in a print without colour.</summary>
    Accent,

    /// <summary>Bare paper.</summary>
    Paper,
}

/// <summary>What draws a stroke.</summary>
/// <param name="Dashes">Lengths drawn and left out in turn, millimetres; empty for an unbroken stroke.</param>
public sealed record Pen(Ink Ink, double WidthMillimetres, ImmutableArray<double> Dashes)
{
    /// <summary>An unbroken stroke.</summary>
    public Pen(Ink ink, double widthMillimetres)
        : this(ink, widthMillimetres, [])
    {
    }
}

/// <summary>The embedded faces.</summary>
public enum Typeface
{
    /// <summary>Sentences, names and notes.</summary>
    Text,

    /// <summary>Titles and act numbers.</summary>
    Strong,

    /// <summary>The lettering of the finished piece.</summary>
    Lettering,
}

/// <summary>What of a text stands at its spot.</summary>
public enum Anchor
{
    /// <summary>Its left end.</summary>
    Left,

    /// <summary>Its middle.</summary>
    Middle,

    /// <summary>Its right end.</summary>
    Right,
}

/// <summary>One thing on a page. Later ones lie on top.</summary>
public abstract record Item(Role Role);

/// <summary>A drawn line, butt-ended.</summary>
public sealed record Stroke(Role Role, Outline Outline, Pen Pen) : Item(Role);

/// <summary>A filled outline.</summary>
public sealed record Fill(Role Role, Outline Outline, Ink Ink) : Item(Role);

/// <summary>A line of text.</summary>
/// <param name="At">On the base line.</param>
/// <param name="SizeMillimetres">The face's em; a capital is <see cref="Fonts.Face.CapitalHeight"/> of it.</param>
/// <param name="TurnDegrees">Anticlockwise about <paramref name="At"/>, 0 for level text.</param>
public sealed record Words(Role Role, string Text, Spot At, Typeface Typeface, double SizeMillimetres, Anchor Anchor, double TurnDegrees, Ink Ink) : Item(Role);
