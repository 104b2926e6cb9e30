using System.Reflection;
using System.Runtime.CompilerServices;
using System.Text.RegularExpressions;

namespace Swarm.Engine.Tests.Architecture;

/// <summary>A folder of the engine that names another one, and who does it.</summary>
internal sealed record FolderUse(string From, string To, string Where);

/// <summary>Which folder of the engine uses which: by the types' declarations, and in the sources by using lines
/// and by names with their folder before them.</summary>
internal static partial class FolderGraph
{
    public const string EngineNamespace = "Swarm.Engine";
    private const BindingFlags Declared = BindingFlags.DeclaredOnly | BindingFlags.Instance | BindingFlags.Static
        | BindingFlags.Public | BindingFlags.NonPublic;

    /// <summary>Uses across folders.</summary>
    public static IReadOnlyList<FolderUse> Uses() =>
        [.. UsesByDeclaration().Concat(UsesByUsing()).Concat(UsesByQualifiedName()).Where(use => use.From != use.To)];

    /// <summary>Types of the engine that the declarations of a folder name.</summary>
    public static IEnumerable<(Type User, Type Used)> TypesNamedIn(string folder) =>
        from type in EngineTypes()
        where Folder(type.Namespace) == folder
        from named in TypesNamedBy(type).SelectMany(Parts)
        where named.Assembly == typeof(Edition).Assembly && !named.IsGenericParameter
        select (type, named);

    /// <summary>The first part of a namespace below the engine's own; empty for the engine's root.</summary>
    public static string? Folder(string? name)
    {
        if (name is null || (name != EngineNamespace && !name.StartsWith(EngineNamespace + '.', StringComparison.Ordinal)))
        {
            return null;
        }

        return name.Length == EngineNamespace.Length ? "" : name[(EngineNamespace.Length + 1)..].Split('.')[0];
    }

    private static IEnumerable<Type> EngineTypes() =>
        typeof(Edition).Assembly.GetTypes().Where(type => Folder(type.Namespace) is not null);

    private static IEnumerable<FolderUse> UsesByDeclaration() =>
        from folder in EngineTypes().Select(type => Folder(type.Namespace)!).Distinct().ToArray()
        from pair in TypesNamedIn(folder)
        let to = Folder(pair.Used.Namespace)
        where !string.IsNullOrEmpty(to)
        select new FolderUse(folder, to, $"{pair.User} names {pair.Used}");

    private static IEnumerable<FolderUse> UsesByUsing() =>
        from file in SourceTree.Files("src/Swarm.Engine", "*.cs")
        from Match match in UsingLine().Matches(File.ReadAllText(file))
        select UseInSource(file, match);

    // Streams.Counter needs no using line inside the engine's namespace.
    private static IEnumerable<FolderUse> UsesByQualifiedName()
    {
        HashSet<string> names = [.. EngineTypes().Select(FirstTwoNames)];
        return
            from file in SourceTree.Files("src/Swarm.Engine", "*.cs")
            from Match match in QualifiedName().Matches(SourceText.Code(File.ReadAllText(file)))
            where names.Contains($"{match.Groups["folder"].Value}.{match.Groups["next"].Value}")
            select UseInSource(file, match);
    }

    // Streams.Counter, or Models.Formulas for a type in a folder of a folder.
    private static string FirstTwoNames(Type type) =>
        string.Join('.', $"{type.Namespace}.{type.Name.Split('`')[0]}"[(EngineNamespace.Length + 1)..].Split('.').Take(2));

    private static FolderUse UseInSource(string file, Match match)
    {
        string path = SourceTree.Relative(file);
        string[] folders = path.Split('/')[2..^1];
        return new(folders.Length == 0 ? "" : folders[0], match.Groups["folder"].Value, $"{path} says {match.Value.Trim()}");
    }

    private static IEnumerable<Type> TypesNamedBy(Type type)
    {
        IEnumerable<Type> declarations =
        [
            .. type.GetInterfaces(),
            .. type.GetFields(Declared).Select(field => field.FieldType),
            .. type.GetProperties(Declared).Select(property => property.PropertyType),
            .. type.GetMethods(Declared).Select(method => method.ReturnType),
            .. Bodies(type).SelectMany(method => method.GetParameters()).Select(parameter => parameter.ParameterType),
            .. Bodies(type).SelectMany(Locals),
        ];
        return type.BaseType is { } parent ? declarations.Append(parent) : declarations;
    }

    private static IEnumerable<MethodBase> Bodies(Type type) => type.GetMembers(Declared).OfType<MethodBase>();

    // Locals hold much of what a body uses, at no cost; the sources' text covers the rest.
    private static IEnumerable<Type> Locals(MethodBase method) =>
        method.GetMethodBody()?.LocalVariables.Select(local => local.LocalType) ?? [];

    private static IEnumerable<Type> Parts(Type type)
    {
        if (type.HasElementType)
        {
            return Parts(type.GetElementType()!);
        }

        IEnumerable<Type> parts = type.IsGenericType ? type.GetGenericArguments().SelectMany(Parts) : [];
        return type.IsDefined(typeof(CompilerGeneratedAttribute), inherit: false) ? parts : parts.Append(type);
    }

    [GeneratedRegex(@"^\s*(?:global )?using (?:static |\w+ = )?Swarm\.Engine\.(?<folder>\w+)[^\r\n]*;", RegexOptions.Multiline)]
    private static partial Regex UsingLine();

    [GeneratedRegex(@"(?<![\w.])(?:Swarm\.Engine\.)?(?<folder>\w+)\.(?<next>\w+)")]
    private static partial Regex QualifiedName();
}
