using RuleAndCompass.Making;

namespace RuleAndCompass.CommandLine;

/// <summary>The plates of a layout as files, in the format an ending names.</summary>
internal static class PlateFiles
{
    public static byte[] Steps(Layout layout, string format, CancellationToken cancellation) => throw new NotImplementedException();

    public static byte[] FullSize(Layout layout, string format, CancellationToken cancellation) => throw new NotImplementedException();

    public static byte[] Cut(Layout layout, string format, CancellationToken cancellation) => throw new NotImplementedException();
}
