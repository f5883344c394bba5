namespace RuleAndCompass.Plates.Scene;

/// <summary>An upright rectangle on a page or on the stock, millimetres; <c>default</c> is the empty one at the corner.</summary>
public readonly record struct Box(double Left, double Top, double Right, double Bottom)
{
    /// <summary>Across.</summary>
    public double Width => Right - Left;

    /// <summary>Up and down.</summary>
    public double Height => Bottom - Top;

    /// <summary>The middle.</summary>
    public Spot Middle => new((Left + Right) / 2, (Top + Bottom) / 2);

    /// <summary>From a corner and two sizes.</summary>
    public static Box Of(double left, double top, double width, double height) => new(left, top, left + width, top + height);

    /// <summary>Larger on every side.</summary>
    public Box Grown(double by) => new(Left - by, Top - by, Right + by, Bottom + by);

    /// <summary>The smallest box round this one and a spot.</summary>
    public Box With(Spot spot) => new(Math.Min(Left, spot.X), Math.Min(Top, spot.Y), Math.Max(Right, spot.X), Math.Max(Bottom, spot.Y));

    /// <summary>What of this box lies in the other.</summary>
    public Box Within(Box other) =>
        new(Math.Max(Left, other.Left), Math.Max(Top, other.Top), Math.Min(Right, other.Right), Math.Min(Bottom, other.Bottom));

    /// <summary>Whether the spot lies inside or on the edge.</summary>
    public bool Holds(Spot spot) => spot.X >= Left && spot.X <= Right && spot.Y >= Top && spot.Y <= Bottom;

    /// <summary>Whether the other box lies wholly inside.</summary>
    public bool Holds(Box other) => other.Left >= Left && other.Right <= Right && other.Top >= Top && other.Bottom <= Bottom;

    /// <summary>Whether the insides share anything.</summary>
    public bool Overlaps(Box other) => Left < other.Right && other.Left < Right && Top < other.Bottom && other.Top < Bottom;
}
