namespace CoreDesign.History.Model;

/// <summary>A row that is written once: the context refuses to change or delete it.</summary>
public interface IKept;
