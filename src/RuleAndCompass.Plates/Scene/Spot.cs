namespace RuleAndCompass.Plates.Scene;

/// <summary>A place on a page: millimetres right of and below its top left corner.</summary>
public readonly record struct Spot(double X, double Y)
{
    /// <summary>The spot <paramref name="right"/> and <paramref name="down"/> millimetres away.</summary>
    public Spot Moved(double right, double down) => new(X + right, Y + down);

    /// <summary>Millimetres from here to <paramref name="other"/>.</summary>
    public double DistanceTo(Spot other) => Math.Sqrt(((other.X - X) * (other.X - X)) + ((other.Y - Y) * (other.Y - Y)));
}
