using System.Diagnostics;
using System.Runtime.Intrinsics;

namespace RuleAndCompass.Bench.Errors;

/// <summary>A function of the language applied to measured quantities; angles in degrees.</summary>
internal sealed class FunctionGauge : Gauge
{
    private const double Degree = Math.PI / 180;

    private readonly Gauge[] arguments;
    private readonly Func<double, double, double> evaluate;
    private readonly Func<double, double, (double First, double Second)> differentiate;

    private FunctionGauge(
        Gauge[] arguments, Func<double, double, double> evaluate, Func<double, double, (double First, double Second)> differentiate)
    {
        this.arguments = arguments;
        this.evaluate = evaluate;
        this.differentiate = differentiate;
    }

    /// <summary>A gauge for the function; several arguments of <c>min</c> and <c>max</c> are taken two by two.</summary>
    public static Gauge Create(string function, Gauge[] arguments)
    {
        if (arguments.Length > 2)
            return arguments.Aggregate((sofar, next) => Create(function, [sofar, next]));

        return (function, arguments.Length) switch
        {
            ("+", 1) => arguments[0],
            ("-", 1) => Of((a, _) => -a, (_, _) => (-1, 0)),
            ("+", 2) => Of((a, b) => a + b, (_, _) => (1, 1)),
            ("-", 2) => Of((a, b) => a - b, (_, _) => (1, -1)),
            ("*", 2) => Of((a, b) => a * b, (a, b) => (b, a)),
            ("/", 2) => Of((a, b) => a / b, (a, b) => (1 / b, -a / (b * b))),
            ("sqrt", 1) => Of((a, _) => Math.Sqrt(a), (a, _) => (0.5 / Math.Sqrt(a), 0)),
            ("sin", 1) => Of((a, _) => Math.Sin(a * Degree), (a, _) => (Math.Cos(a * Degree) * Degree, 0)),
            ("cos", 1) => Of((a, _) => Math.Cos(a * Degree), (a, _) => (-Math.Sin(a * Degree) * Degree, 0)),
            ("tan", 1) => Of((a, _) => Math.Tan(a * Degree), (a, _) => (Degree / (Math.Cos(a * Degree) * Math.Cos(a * Degree)), 0)),
            ("asin", 1) => Of((a, _) => Math.Asin(a) / Degree, (a, _) => (1 / (Degree * Math.Sqrt(1 - a * a)), 0)),
            ("acos", 1) => Of((a, _) => Math.Acos(a) / Degree, (a, _) => (-1 / (Degree * Math.Sqrt(1 - a * a)), 0)),
            ("atan", 1) => Of((a, _) => Math.Atan(a) / Degree, (a, _) => (1 / (Degree * (1 + a * a)), 0)),
            ("atan", 2) => Of((y, x) => Math.Atan2(y, x) / Degree, (y, x) => (x / (Degree * (x * x + y * y)), -y / (Degree * (x * x + y * y)))),
            ("abs", 1) => Of((a, _) => Math.Abs(a), (a, _) => (a < 0 ? -1 : 1, 0)),
            ("min" or "max", 1) => arguments[0],
            ("min", 2) => Of(Math.Min, (a, b) => a <= b ? (1, 0) : (0, 1)),
            ("max", 2) => Of(Math.Max, (a, b) => a >= b ? (1, 0) : (0, 1)),
            ("whole", 1) => Of((a, _) => Math.Floor(a), (_, _) => (0, 0)),
            ("remainder", 2) => Of((a, b) => a - b * Math.Floor(a / b), (a, b) => (1, -Math.Floor(a / b))),
            _ => throw new UnreachableException($"No gauge for `{function}` of {arguments.Length}."),
        };

        FunctionGauge Of(Func<double, double, double> evaluate, Func<double, double, (double First, double Second)> differentiate) =>
            new(arguments, evaluate, differentiate);
    }

    public override void Need(Slice slice)
    {
        foreach (Gauge argument in arguments)
            argument.Need(slice);
    }

    public override double Value(double[] slots) => evaluate(arguments[0].Value(slots), arguments.Length > 1 ? arguments[1].Value(slots) : 0);

    public override void Pull(Sweep sweep, double seed)
    {
        double first = arguments[0].Value(sweep.Value);
        double second = arguments.Length > 1 ? arguments[1].Value(sweep.Value) : 0;
        (double byFirst, double bySecond) = differentiate(first, second);
        if (!double.IsFinite(byFirst) || !double.IsFinite(bySecond))
        {
            sweep.MarkSingular(0);
            return;
        }

        arguments[0].Pull(sweep, seed * byFirst);
        if (arguments.Length > 1)
            arguments[1].Pull(sweep, seed * bySecond);
    }

    public override Vector256<double> Replay(ReadOnlySpan<Vector256<double>> slots)
    {
        Vector256<double> first = arguments[0].Replay(slots);
        Vector256<double> second = arguments.Length > 1 ? arguments[1].Replay(slots) : Vector256<double>.Zero;
        return Vector256.Create(
            evaluate(first[0], second[0]), evaluate(first[1], second[1]), evaluate(first[2], second[2]), evaluate(first[3], second[3]));
    }
}
