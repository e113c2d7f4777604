using System.Reflection;
using System.Runtime.CompilerServices;

namespace DiagnosticAccuracy.Tests.Contracts;

/// <summary>What holds for every public type, by reflection.</summary>
public class ShapeOfTypesTests
{
    public static TheoryData<Type> PublicTypes() => [.. PublicSurface.Types];

    [Theory]
    [MemberData(nameof(PublicTypes))]
    public void Public_types_are_immutable(Type type)
    {
        ArgumentNullException.ThrowIfNull(type);
        if (type.IsEnum || type.IsInterface)
        {
            return;
        }

        const BindingFlags all = BindingFlags.Public | BindingFlags.NonPublic | BindingFlags.Instance | BindingFlags.DeclaredOnly;
        Assert.All(type.GetFields(all), field => Assert.True(field.IsInitOnly, $"{type}.{field.Name} can be written"));
        Assert.All(
            type.GetProperties(all).Where(p => p.SetMethod is not null),
            property => Assert.Contains(
                typeof(IsExternalInit).FullName,
                property.SetMethod!.ReturnParameter.GetRequiredCustomModifiers().Select(m => m.FullName)));
        if (type.IsValueType)
        {
            Assert.Contains(type.GetCustomAttributesData(), a => a.AttributeType.Name == "IsReadOnlyAttribute");
        }
        else
        {
            bool closedHierarchy = type.IsAbstract
                && type.GetConstructors(all).All(c => !c.IsPublic && (c.IsPrivate || c.IsFamilyAndAssembly || c.IsAssembly || IsCopyConstructor(c, type)));
            Assert.True(type.IsSealed || closedHierarchy, $"{type} is open to derivation");
        }
    }

    [Fact]
    public void No_type_of_the_numerics_package_is_in_a_public_signature()
    {
        foreach (Type type in PublicSurface.Types)
        {
            Assert.DoesNotContain(PublicSurface.Parts(type.BaseType ?? type).Concat(type.GetInterfaces()), IsForeign);
            foreach (MethodBase method in PublicSurface.Members(type))
            {
                Assert.DoesNotContain(PublicSurface.TypesInSignature(method), IsForeign);
            }
        }
    }

    [Fact]
    public void No_public_member_returns_a_tuple_or_an_array()
    {
        foreach (Type type in PublicSurface.Types)
        {
            foreach (MethodInfo method in PublicSurface.Members(type).OfType<MethodInfo>())
            {
                Assert.False(method.ReturnType.IsArray, $"{type}.{method.Name} returns an array, which its caller could change");
                Assert.DoesNotContain(PublicSurface.Parts(method.ReturnType), t => t.FullName?.StartsWith("System.ValueTuple", StringComparison.Ordinal) == true);
            }
        }
    }

    [Theory]
    [MemberData(nameof(PublicTypes))]
    public void The_default_of_a_value_is_usable_and_says_what_it_is(Type type)
    {
        ArgumentNullException.ThrowIfNull(type);
        if (!type.IsValueType || type.IsEnum)
        {
            return;
        }

        object value = Activator.CreateInstance(type)!;
        Assert.False(string.IsNullOrWhiteSpace(value.ToString()), $"default({type.Name}) has no text");
        Assert.Equal(Activator.CreateInstance(type), value);
        Assert.Equal(Activator.CreateInstance(type)!.GetHashCode(), value.GetHashCode());
        if (value is IQuantity quantity)
        {
            AssertCoherent(quantity);
        }

        if (value is IIntervalQuantity interval)
        {
            ConfidenceInterval result = interval.Interval();
            Assert.Equal(result.IsDefined, result.WhyUndefined is null);
        }

        // Reading any property of a default must not fail.
        foreach (PropertyInfo property in type.GetProperties(BindingFlags.Public | BindingFlags.Instance).Where(p => p.GetIndexParameters().Length == 0))
        {
            _ = property.GetValue(value);
        }
    }

    internal static void AssertCoherent(IQuantity quantity)
    {
        Assert.Equal(quantity.IsDefined, quantity.WhyUndefined is null);
        Assert.Equal(!quantity.IsDefined, double.IsNaN(quantity.Value));
    }

    private static bool IsForeign(Type type) =>
        type.Assembly.GetName().Name?.StartsWith("MathNet", StringComparison.Ordinal) == true;

    private static bool IsCopyConstructor(ConstructorInfo constructor, Type type) =>
        constructor.GetParameters() is [{ ParameterType: var parameter }] && parameter == type;
}
