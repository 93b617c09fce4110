using System.Runtime.CompilerServices;

[assembly: InternalsVisibleTo("CoreDesign.Magnetics.Tests")]
