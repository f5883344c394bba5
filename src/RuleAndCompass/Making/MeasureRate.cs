using System.Diagnostics;
using RuleAndCompass.Bench;

namespace RuleAndCompass.Making;

/// <summary>Differentiates a formula by one of the values it is made of.</summary>
/// <remarks>Forward differentiation: Griewank and Walther, Evaluating Derivatives (2nd ed., 2008), ch. 3.</remarks>
internal static class MeasureRate
{
    private const double DegreesPerRadian = 180 / Math.PI;

    /// <summary>True where the formula holds a measure of what is drawn.</summary>
    public static bool HoldsMeasure(Measure? formula) => formula switch
    {
        null or ConstantMeasure => false,
        FunctionMeasure function => function.Arguments.Any(HoldsMeasure),
        _ => true,
    };

    /// <summary>How fast the formula's value changes with <paramref name="by"/>: in its own unit (degrees, millimetres) for each unit of that.</summary>
    /// <param name="formula">Without measures.</param>
    /// <param name="by">A part of the formula, the very object.</param>
    public static double Of(Measure formula, Measure by) => Both(formula, by).Rate;

    private static (double Value, double Rate) Both(Measure formula, Measure by)
    {
        (double value, double rate) = formula switch
        {
            ConstantMeasure constant => (constant.Value, 0),
            FunctionMeasure function => Applied(function, by),
            _ => throw new UnreachableException($"No rate of {formula.GetType().Name}."),
        };
        return ReferenceEquals(formula, by) ? (value, 1) : (value, rate);
    }

    private static (double Value, double Rate) Applied(FunctionMeasure function, Measure by)
    {
        (double x, double dx) = Both(function.Arguments[0], by);
        (double y, double dy) = function.Arguments.Length > 1 ? Both(function.Arguments[1], by) : (0, 0);
        double radians = x / DegreesPerRadian;
        switch (function.Function)
        {
            case "-" when function.Arguments.Length == 1:
                return (-x, -dx);
            case "+":
                return (x + y, dx + dy);
            case "-":
                return (x - y, dx - dy);
            case "*":
                return (x * y, (dx * y) + (x * dy));
            case "/":
                return (x / y, ((dx * y) - (x * dy)) / (y * y));
            case "sqrt":
                double root = Math.Sqrt(x);
                return (root, dx / (2 * root));
            case "sin":
                return (Math.Sin(radians), Math.Cos(radians) * dx / DegreesPerRadian);
            case "cos":
                return (Math.Cos(radians), -Math.Sin(radians) * dx / DegreesPerRadian);
            case "tan":
                double tangent = Math.Tan(radians);
                return (tangent, (1 + (tangent * tangent)) * dx / DegreesPerRadian);
            case "asin":
                return (Math.Asin(x) * DegreesPerRadian, dx / Math.Sqrt(1 - (x * x)) * DegreesPerRadian);
            case "acos":
                return (Math.Acos(x) * DegreesPerRadian, -dx / Math.Sqrt(1 - (x * x)) * DegreesPerRadian);
            case "atan" when function.Arguments.Length == 1:
                return (Math.Atan(x) * DegreesPerRadian, dx / (1 + (x * x)) * DegreesPerRadian);
            case "atan":
                // x holds the sine's part and y the cosine's: atan(y, x) as it is written
                return (Math.Atan2(x, y) * DegreesPerRadian, ((dx * y) - (x * dy)) / ((x * x) + (y * y)) * DegreesPerRadian);
            default:
                throw new UnreachableException($"No rate of {function.Function}.");
        }
    }
}
