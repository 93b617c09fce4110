using CoreDesign.Estimating.Contracts;

namespace CoreDesign.Web.Features.Designs;

/// <summary>The use case that turns a design into its study, with the steels of this works. A save stores what it returns.</summary>
public delegate Task<Outcome<Study>> StudyOfDesign(DesignInput design, CancellationToken cancel);
