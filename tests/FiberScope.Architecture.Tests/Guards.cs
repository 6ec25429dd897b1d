using System.Reflection;
using System.Runtime.CompilerServices;

namespace FiberScope.Architecture.Tests;

/// <summary>The checks themselves, so that a test can turn them on an offender and see them bite.</summary>
internal static class Guards
{
    private static readonly string[] UnitSuffixes =
        ["Metres", "Micrometres", "Nanometres", "Um", "Nm", "Pascals", "Pa", "Kelvins", "Celsius", "Seconds", "Kilograms"];

    private static readonly string[] EmptyNames = ["Helper", "Helpers", "Utils", "Utility", "Manager", "Common", "Misc"];

    /// <summary>Fields that are static and can be set again.</summary>
    public static IEnumerable<string> ReassignableStatics(IEnumerable<Type> types) =>
        from type in types
        where !IsGenerated(type)
        from field in type.GetFields(BindingFlags.Static | BindingFlags.Public | BindingFlags.NonPublic | BindingFlags.DeclaredOnly)
        where !field.IsInitOnly && !field.IsLiteral && !field.Name.Contains('<', StringComparison.Ordinal)
        select $"{type.FullName}.{field.Name}";

    /// <summary>Public signatures that show a type from a package which must stay inside.</summary>
    public static IEnumerable<string> Leaks(IEnumerable<Type> types, string package) =>
        from type in types
        where type.IsVisible
        from member in type.GetMembers(BindingFlags.Static | BindingFlags.Instance | BindingFlags.Public | BindingFlags.DeclaredOnly)
        from shown in Shown(member)
        where Parts(shown).Any(part => part.Namespace?.StartsWith(package, StringComparison.Ordinal) == true)
        select $"{type.FullName}.{member.Name} shows {shown}";

    /// <summary>Public parameters and properties that are a bare number with a unit in the name.</summary>
    public static IEnumerable<string> BareUnits(IEnumerable<Type> types) =>
        from type in types
        where type.IsVisible
        from method in type.GetMethods(BindingFlags.Static | BindingFlags.Instance | BindingFlags.Public | BindingFlags.DeclaredOnly)
        from parameter in method.GetParameters()
        where parameter.ParameterType == typeof(double) && HasUnit(parameter.Name ?? "")
        select $"{type.FullName}.{method.Name}({parameter.Name})";

    /// <summary>Types with names that say nothing.</summary>
    public static IEnumerable<string> EmptyTypeNames(IEnumerable<Type> types) =>
        types.Where(t => Array.Exists(EmptyNames, name => t.Name.EndsWith(name, StringComparison.Ordinal))).Select(t => t.FullName!);

    private static bool HasUnit(string name) =>
        Array.Exists(UnitSuffixes, unit => name.EndsWith(unit, StringComparison.Ordinal) || string.Equals(name, unit, StringComparison.OrdinalIgnoreCase));

    private static bool IsGenerated(Type type) =>
        type.Name.Contains('<', StringComparison.Ordinal) || type.IsDefined(typeof(CompilerGeneratedAttribute), inherit: false);

    private static IEnumerable<Type> Shown(MemberInfo member) => member switch
    {
        MethodInfo method => method.GetParameters().Select(p => p.ParameterType).Append(method.ReturnType),
        ConstructorInfo constructor => constructor.GetParameters().Select(p => p.ParameterType),
        PropertyInfo property => [property.PropertyType],
        FieldInfo field => [field.FieldType],
        _ => [],
    };

    private static IEnumerable<Type> Parts(Type type) =>
        type.HasElementType ? Parts(type.GetElementType()!) : type.GetGenericArguments().SelectMany(Parts).Append(type);
}
