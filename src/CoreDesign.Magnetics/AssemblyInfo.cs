using System.Runtime.CompilerServices;

[assembly: InternalsVisibleTo("CoreDesign.Magnetics.Tests")]
[assembly: InternalsVisibleTo("CoreDesign.Benchmarks")]
