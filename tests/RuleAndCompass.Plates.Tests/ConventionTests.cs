using System.Reflection;
using System.Xml.Linq;

namespace RuleAndCompass.Plates.Tests;

public sealed class ConventionTests
{
    [Fact]
    public void Only_the_plates_know_the_drawing_library()
    {
        string[] projects = Directory.GetFiles(Path.Combine(Repository.Root, "src"), "*.csproj", SearchOption.AllDirectories);

        string[] knowing = [.. projects.Where(project => XDocument.Load(project).Descendants("PackageReference").Any(reference => reference.Attribute("Include")!.Value.StartsWith("SkiaSharp", StringComparison.Ordinal)))];

        knowing.Select(Path.GetFileNameWithoutExtension).ShouldBe(["RuleAndCompass.Plates"]);
        typeof(Making.Layout).Assembly.GetReferencedAssemblies().ShouldNotContain(assembly => assembly.Name == "SkiaSharp");
        typeof(StepPlates).Assembly.GetReferencedAssemblies().ShouldContain(assembly => assembly.Name == "SkiaSharp");
    }

    [Fact]
    public void No_scene_and_no_public_member_speaks_of_the_drawing_library()
    {
        IEnumerable<Type> spoken = typeof(StepPlates).Assembly.GetExportedTypes()
            .SelectMany(type => type.GetMembers(BindingFlags.Public | BindingFlags.Instance | BindingFlags.Static | BindingFlags.DeclaredOnly))
            .SelectMany(member => member switch
            {
                MethodInfo method => method.GetParameters().Select(parameter => parameter.ParameterType).Append(method.ReturnType),
                PropertyInfo property => [property.PropertyType],
                FieldInfo field => [field.FieldType],
                _ => [],
            });

        spoken.ShouldNotContain(type => type.Assembly.GetName().Name == "SkiaSharp");
    }
}
