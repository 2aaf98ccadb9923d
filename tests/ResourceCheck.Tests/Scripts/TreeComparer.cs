using System.Collections;
using System.Reflection;
using ResourceCheck.Scripts;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Tests.Scripts;

/// <summary>Compares trees node by node, spans and source left out: lists in records compare by reference, so records' own equality will not do.</summary>
internal static class TreeComparer
{
    /// <summary>Where two trees differ first, or null when they are equal.</summary>
    public static string? Difference(ScriptTree first, ScriptTree second) =>
        Difference(first.Statements, second.Statements, "statements") ?? Difference(first.Comments, second.Comments, "comments");

    public static string? Difference(object? first, object? second, string path)
    {
        if (first is null || second is null || first is string || first.GetType().IsValueType)
            return Equals(first, second) ? null : $"{path}: {first ?? "nothing"} and {second ?? "nothing"}";
        if (first is IEnumerable items)
            return Lists([.. items.Cast<object>()], [.. ((IEnumerable)second).Cast<object>()], path);
        if (first.GetType() != second.GetType())
            return $"{path}: {first.GetType().Name} and {second.GetType().Name}";
        return first.GetType().GetProperties(BindingFlags.Public | BindingFlags.Instance)
            .Where(p => p.PropertyType != typeof(Span))
            .Select(p => Difference(p.GetValue(first), p.GetValue(second), $"{path}.{p.Name}"))
            .FirstOrDefault(d => d is not null);
    }

    private static string? Lists(object[] first, object[] second, string path) =>
        first.Length != second.Length
            ? $"{path}: {first.Length} and {second.Length} items"
            : first.Select((item, i) => Difference(item, second[i], $"{path}[{i}]")).FirstOrDefault(d => d is not null);
}
