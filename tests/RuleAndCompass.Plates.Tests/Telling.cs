namespace RuleAndCompass.Plates.Tests;

/// <summary>Collects progress at once, on the caller's thread.</summary>
internal sealed class Telling(List<double> told) : IProgress<double>
{
    public void Report(double value) => told.Add(value);
}
