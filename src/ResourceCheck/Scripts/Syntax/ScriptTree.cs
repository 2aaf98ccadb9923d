namespace ResourceCheck.Scripts.Syntax;

// The node records of the tree stand together by family: each is one line, and a reader needs them side by side.

/// <summary>A parsed script: its statements in order. Comments are kept so that the formatter loses nothing.</summary>
/// <param name="Source">The text it came from.</param>
/// <param name="Statements">Top-level statements in the order written.</param>
/// <param name="Comments">All comments in the order written.</param>
public sealed record ScriptTree(SourceText Source, IReadOnlyList<Statement> Statements, IReadOnlyList<Comment> Comments);

/// <summary>A comment: <c>#</c> to the end of the line.</summary>
/// <param name="Span">Where it stands, the <c>#</c> included.</param>
/// <param name="Text">The text behind the <c>#</c>, as written.</param>
/// <param name="OwnLine">Whether nothing but blanks stands before it.</param>
public sealed record Comment(Span Span, string Text, bool OwnLine);

/// <summary>A name as written, with its place.</summary>
/// <param name="Span">Where it stands.</param>
/// <param name="Text">The name.</param>
public sealed record Name(Span Span, string Text);

/// <summary>A quoted text; <c>{m}</c> inside a label is replaced by a loop's counter.</summary>
/// <param name="Span">Where it stands, quotes included.</param>
/// <param name="Text">The content without quotes.</param>
public sealed record Quoted(Span Span, string Text);
