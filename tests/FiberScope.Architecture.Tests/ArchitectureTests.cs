using System.Reflection;

namespace FiberScope.Architecture.Tests;

public sealed class ArchitectureTests
{
    private static readonly Dictionary<string, Assembly> Assemblies = Arrows.Allowed.Keys.ToDictionary(
        project => project,
        project => Assembly.Load(project == "Cli" ? "fiberscope" : "FiberScope." + project),
        StringComparer.Ordinal);

    public static TheoryData<string> Projects => [.. Arrows.Projects];

    [Fact]
    public void The_table_and_the_folders_name_the_same_projects() =>
        Assert.Equal(Arrows.Allowed.Keys.Order(StringComparer.Ordinal), Arrows.Projects);

    [Theory]
    [MemberData(nameof(Projects))]
    public void A_project_references_exactly_what_the_table_allows(string project) =>
        Assert.Equal(Arrows.Allowed[project].Order(StringComparer.Ordinal), Arrows.References(project));

    [Theory]
    [MemberData(nameof(Projects))]
    public void A_package_is_used_in_its_home_only(string project) =>
        Assert.All(Arrows.Packages(project), package =>
            Assert.True(
                Arrows.FreePackages.Contains(package) || (Arrows.Homes.TryGetValue(package, out var homes) && homes.Contains(project)),
                $"{project} uses {package}, whose home is elsewhere or not in the table"));

    [Theory]
    [MemberData(nameof(Projects))]
    public void No_native_picture_type_is_shown(string project)
    {
        Assert.Empty(Guards.Leaks(Assemblies[project].GetTypes(), "OpenCvSharp"));
        Assert.Empty(Guards.Leaks(Assemblies[project].GetTypes(), "SixLabors"));
    }

    [Theory]
    [MemberData(nameof(Projects))]
    public void No_static_field_can_be_reassigned(string project) =>
        Assert.Empty(Guards.ReassignableStatics(Assemblies[project].GetTypes()));

    [Theory]
    [MemberData(nameof(Projects))]
    public void No_type_is_named_for_nothing(string project) =>
        Assert.Empty(Guards.EmptyTypeNames(Assemblies[project].GetTypes()));

    [Theory]
    [MemberData(nameof(Projects))]
    public void No_public_parameter_is_a_bare_number_with_a_unit(string project) =>
        Assert.Empty(Guards.BareUnits(Assemblies[project].GetTypes()));

    [Fact]
    public void The_guards_bite()
    {
        Assert.NotEmpty(Guards.Leaks([typeof(Offender)], "System.Xml"));
        Assert.NotEmpty(Guards.ReassignableStatics([typeof(Offender)]));
        Assert.NotEmpty(Guards.BareUnits([typeof(Offender)]));
        Assert.NotEmpty(Guards.EmptyTypeNames([typeof(OffenceManager)]));
    }

    public static class Offender
    {
#pragma warning disable CA2211, CS0649, MA0069 // The offence is the point: the guard must see it.
        public static int Settable;
#pragma warning restore CA2211, CS0649, MA0069

        public static System.Xml.Linq.XElement? Shown(double widthMetres) => widthMetres > 0 ? null : new("x");
    }

    private sealed class OffenceManager;
}
