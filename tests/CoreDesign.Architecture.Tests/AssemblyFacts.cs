using System.Reflection.Metadata;
using System.Reflection.PortableExecutable;

namespace CoreDesign.Architecture.Tests;

/// <summary>What a built assembly leans on, read from its metadata: nothing that the compiler left out can hide a use.</summary>
internal sealed class AssemblyFacts
{
    private AssemblyFacts(IReadOnlySet<string> assemblies, IReadOnlySet<string> types, IReadOnlySet<string> members)
    {
        Assemblies = assemblies;
        Types = types;
        Members = members;
    }

    /// <summary>Names of referenced assemblies.</summary>
    public IReadOnlySet<string> Assemblies { get; }

    /// <summary>Full names of types that other assemblies hold.</summary>
    public IReadOnlySet<string> Types { get; }

    /// <summary>Members used of those types, "System.DateTime.get_UtcNow".</summary>
    public IReadOnlySet<string> Members { get; }

    public static AssemblyFacts Of(string assembly)
    {
        using var file = File.OpenRead(Path.Combine(AppContext.BaseDirectory, assembly + ".dll"));
        using var image = new PEReader(file);
        var data = image.GetMetadataReader();
        var types = data.TypeReferences.ToDictionary(handle => handle, handle => NameOf(data, handle));
        return new AssemblyFacts(
            data.AssemblyReferences.Select(h => data.GetString(data.GetAssemblyReference(h).Name)).ToHashSet(StringComparer.Ordinal),
            types.Values.ToHashSet(StringComparer.Ordinal),
            data.MemberReferences.Select(data.GetMemberReference).Where(m => m.Parent.Kind == HandleKind.TypeReference)
                .Select(m => $"{types[(TypeReferenceHandle)m.Parent]}.{data.GetString(m.Name)}").ToHashSet(StringComparer.Ordinal));
    }

    private static string NameOf(MetadataReader data, TypeReferenceHandle handle)
    {
        var type = data.GetTypeReference(handle);
        var name = data.GetString(type.Name);
        if (type.ResolutionScope.Kind == HandleKind.TypeReference) return $"{NameOf(data, (TypeReferenceHandle)type.ResolutionScope)}.{name}";
        return type.Namespace.IsNil ? name : $"{data.GetString(type.Namespace)}.{name}";
    }
}
