using System.Reflection;

namespace DiagnosticAccuracy.Tests.Contracts;

/// <summary>A confidence outside (0, 1) cannot be made, and every method that takes one takes it as the type that refuses.</summary>
public class ConfidenceContractTests
{
    [Fact]
    public void Every_method_that_takes_a_confidence_takes_it_as_the_type_that_refuses_bad_levels()
    {
        string[] suspicious = ["level", "confidence", "alpha", "confidenceLevel"];
        foreach (Type type in PublicSurface.Types.Where(t => t != typeof(Confidence)))
        {
            foreach (MethodBase method in PublicSurface.Members(type))
            {
                foreach (ParameterInfo parameter in method.GetParameters())
                {
                    if (suspicious.Contains(parameter.Name, StringComparer.OrdinalIgnoreCase))
                    {
                        Assert.Equal(typeof(Confidence), parameter.ParameterType);
                    }
                }
            }
        }
    }

    [Fact]
    public void No_factory_of_confidence_lets_a_bad_level_through()
    {
        MethodInfo[] factories =
            [.. typeof(Confidence).GetMethods(BindingFlags.Public | BindingFlags.Static).Where(m => m.ReturnType == typeof(Confidence))];
        Assert.Equal(4, factories.Length);
        foreach (MethodInfo factory in factories)
        {
            foreach (double bad in new[] { double.NaN, 0, 1, -1, 2, double.PositiveInfinity })
            {
                object?[] arguments = [bad, .. factory.GetParameters().Skip(1).Select(p => p.DefaultValue)];
                TargetInvocationException wrapped = Assert.Throws<TargetInvocationException>(() => factory.Invoke(null, arguments));
                ArgumentOutOfRangeException error = Assert.IsType<ArgumentOutOfRangeException>(wrapped.InnerException);
                Assert.Equal(factory.GetParameters()[0].Name, error.ParamName);
            }
        }
    }

    [Fact]
    public void Every_optional_confidence_is_two_sided_95_percent()
    {
        int seen = 0;
        foreach (Type type in PublicSurface.Types)
        {
            foreach (ParameterInfo parameter in PublicSurface.Members(type).SelectMany(m => m.GetParameters()))
            {
                if (parameter.ParameterType == typeof(Confidence) && parameter.HasDefaultValue)
                {
                    // A default of a structure shows as null in metadata.
                    Assert.Null(parameter.DefaultValue);
                    seen++;
                }
            }
        }

        Assert.True(seen >= 4);
    }
}
