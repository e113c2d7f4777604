using System.Reflection;
using System.Runtime.CompilerServices;

namespace DiagnosticAccuracy.Tests.Contracts;

internal static class PublicSurface
{
    public static readonly Assembly Library = typeof(Proportion).Assembly;

    public static IEnumerable<Type> Types => Library.GetExportedTypes();

    public static IEnumerable<MethodBase> Members(Type type) =>
        type.GetMembers(BindingFlags.Public | BindingFlags.Instance | BindingFlags.Static | BindingFlags.DeclaredOnly).OfType<MethodBase>();

    public static bool IsCompilerMade(MemberInfo member) => member.IsDefined(typeof(CompilerGeneratedAttribute), inherit: false);

    /// <summary>The type itself and everything it is built of: elements, generic arguments.</summary>
    public static IEnumerable<Type> Parts(Type type)
    {
        yield return type;
        if (type.HasElementType)
        {
            foreach (Type part in Parts(type.GetElementType()!))
            {
                yield return part;
            }
        }

        foreach (Type argument in type.IsGenericType ? type.GetGenericArguments() : [])
        {
            foreach (Type part in Parts(argument))
            {
                yield return part;
            }
        }
    }

    public static IEnumerable<Type> TypesInSignature(MethodBase method) =>
        method.GetParameters().Select(p => p.ParameterType)
            .Append(method is MethodInfo info ? info.ReturnType : typeof(void))
            .SelectMany(Parts);
}
