using System.Reflection;
using System.Xml.Linq;

namespace NetFault.Tests.House;

/// <summary>The house's rules, all offenders at once.</summary>
public class HouseRuleTests
{
    private static readonly Assembly Library = typeof(FaultStudy).Assembly;

    private static IEnumerable<Type> PublicTypes => Library.GetExportedTypes().Where(type => type.Namespace?.StartsWith("NetFault") == true);

    [Fact]
    public void Public_classes_are_sealed_or_static_or_bases_that_nobody_outside_can_derive_from() =>
        PublicTypes.Where(type => type.IsClass && !type.IsSealed)
            .Where(type => !type.IsAbstract || Constructors(type).Any(one => one.IsPublic || one.IsFamily && !IsCopy(one) || one.IsFamilyOrAssembly && !IsCopy(one)))
            .Should().BeEmpty();

    [Fact]
    public void Everything_public_stands_in_one_namespace() =>
        PublicTypes.Select(type => type.Namespace).Distinct().Should().Equal("NetFault");

    [Fact]
    public void Only_the_builder_has_setters_that_are_not_init() =>
        PublicTypes.SelectMany(type => type.GetProperties())
            .Where(property => property.DeclaringType!.Assembly == Library && property.SetMethod is { IsPublic: true } set && !IsInit(set))
            .Select(property => property.DeclaringType!.Name)
            .Distinct().Should().Equal(nameof(NetworkBuilder));

    [Fact]
    public void No_static_field_can_change() =>
        Library.GetTypes().Where(type => type.Namespace?.StartsWith("NetFault") == true)
            .SelectMany(type => type.GetFields(BindingFlags.Static | BindingFlags.Public | BindingFlags.NonPublic))
            .Where(field => !field.IsInitOnly && !field.IsLiteral && !field.Name.Contains('<'))
            .Select(field => $"{field.DeclaringType!.Name}.{field.Name}")
            .Should().BeEmpty();

    [Fact]
    public void Every_exception_is_sealed_and_carries_data() =>
        PublicTypes.Where(type => typeof(Exception).IsAssignableFrom(type))
            .Where(type => !type.IsSealed || type.GetProperties(BindingFlags.DeclaredOnly | BindingFlags.Instance | BindingFlags.Public).Length == 0)
            .Should().BeEmpty();

    [Fact]
    public void Every_public_member_is_documented_with_a_meaning()
    {
        var file = Path.ChangeExtension(Library.Location, ".xml");
        var documented = XDocument.Load(file).Descendants("member")
            .Where(member => member.Element("inheritdoc") is not null || member.Element("summary")?.Value.Trim().Length > 10)
            .Select(member => member.Attribute("name")!.Value).ToHashSet();
        PublicTypes.Select(type => "T:" + type.FullName)
            .Concat(PublicTypes.SelectMany(type => type.GetProperties(BindingFlags.DeclaredOnly | BindingFlags.Instance | BindingFlags.Static | BindingFlags.Public))
                .Where(property => !IsOfRecord(property))
                .Select(property => $"P:{property.DeclaringType!.FullName}.{property.Name}"))
            .Where(name => !documented.Contains(name))
            .Should().BeEmpty();
    }

    /// <summary>A record's positional properties are documented as parameters of the type.</summary>
    private static bool IsOfRecord(PropertyInfo property) =>
        property.DeclaringType!.GetConstructors(BindingFlags.Instance | BindingFlags.Public | BindingFlags.NonPublic)
            .Any(constructor => constructor.GetParameters().Any(parameter => parameter.Name == property.Name))
        || property.Name == "EqualityContract";

    private static bool IsInit(MethodInfo set) =>
        set.ReturnParameter.GetRequiredCustomModifiers().Any(modifier => modifier.Name == "IsExternalInit");

    private static bool IsCopy(ConstructorInfo constructor) => constructor.GetParameters() is [{ } only] && only.ParameterType == constructor.DeclaringType;

    private static ConstructorInfo[] Constructors(Type type) =>
        type.GetConstructors(BindingFlags.Instance | BindingFlags.Public | BindingFlags.NonPublic);
}
