using ResourceCheck.Diagnostics;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Tests.Binding;

/// <summary>Short ways from a text to what binding says of it.</summary>
internal static class Bound
{
    /// <summary>Parse and bind findings together, as the tool shows them.</summary>
    public static (Protocol? Protocol, IReadOnlyList<Diagnostic> Findings) From(string name, string text, params (string Name, Rational Value)[] parameters)
    {
        var (tree, form) = Script.Parse(new SourceText(name, text));
        Outcome<Protocol> outcome = Script.Bind(tree, parameters.ToDictionary(p => p.Name, p => p.Value));
        return (form.Count == 0 ? outcome.Value : null, [.. form, .. outcome.Findings]);
    }

    /// <summary>The protocol of a right script.</summary>
    public static Protocol Right(string text, params (string Name, Rational Value)[] parameters)
    {
        var (protocol, findings) = From("test.protocol", text, parameters);
        Xunit.Assert.True(protocol is not null, string.Join("\n\n", findings));
        return protocol;
    }

    /// <summary>Codes of the findings of a wrong script, in order.</summary>
    public static string[] Codes(string text, params (string Name, Rational Value)[] parameters) =>
        [.. From("test.protocol", text, parameters).Findings.Select(f => f.Code)];

    /// <summary>A script of three parties with a body and success.</summary>
    public static string Three(string body) => $"parties Ada, Ben, Cyd\nresource antisymmetric on all\n{body}\nsuccess when true\n";
}
