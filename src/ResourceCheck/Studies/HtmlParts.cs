namespace ResourceCheck.Studies;

/// <summary>Style and script of the HTML report.</summary>
internal static class HtmlParts
{
    /// <summary>Light and dark, narrow screens and A4 paper. Wide tables scroll inside their own box.</summary>
    public const string Style = """
        :root { color-scheme: light dark; --ink: #222; --paper: #fff; --faint: #ddd; --link: #1d4f7c; --good: #1c5e3c; --bad: #8c2f1b; --shade: #f5f5f2; }
        @media (prefers-color-scheme: dark) { :root { --ink: #e6e6e3; --paper: #17191b; --faint: #444; --link: #9cc4e8; --good: #8fd0ab; --bad: #f0a58f; --shade: #212427; } }
        * { box-sizing: border-box; }
        body { margin: 0 auto; max-width: 62rem; padding: 1rem; font: 1rem/1.5 "Helvetica Neue", Arial, sans-serif; color: var(--ink); background: var(--paper); overflow-wrap: anywhere; }
        a { color: var(--link); }
        .skip { position: absolute; left: -99rem; }
        .skip:focus { position: static; }
        h1 { font-size: 1.7rem; line-height: 1.2; }
        h2 { font-size: 1.3rem; margin-top: 2.5rem; border-bottom: 1px solid var(--faint); }
        h3 { font-size: 1.05rem; margin-bottom: .3rem; }
        h4 { font-size: 1rem; margin-bottom: .2rem; }
        nav ul { display: flex; flex-wrap: wrap; gap: .2rem 1rem; padding: 0; list-style: none; }
        .headline { padding: .4rem .8rem; border-left: .3rem solid var(--faint); background: var(--shade); }
        .headline.good { border-color: var(--good); }
        .headline.bad { border-color: var(--bad); }
        .wide { overflow-x: auto; margin: 1rem 0; }
        table { border-collapse: collapse; font-size: .9rem; }
        caption { text-align: left; font-weight: bold; padding-bottom: .3rem; }
        th, td { text-align: left; vertical-align: top; padding: .25rem .7rem .25rem 0; border-bottom: 1px solid var(--faint); overflow-wrap: normal; }
        td.number { text-align: right; font-variant-numeric: tabular-nums; white-space: nowrap; }
        th button { font: inherit; font-weight: bold; color: inherit; background: none; border: 0; padding: 0; text-align: left; cursor: pointer; }
        th button::after { content: " \2195"; color: var(--link); font-weight: normal; }
        th[aria-sort="ascending"] button::after { content: " \2191"; }
        th[aria-sort="descending"] button::after { content: " \2193"; }
        :focus-visible { outline: 2px solid var(--link); outline-offset: 2px; }
        figure { margin: 1rem 0; }
        .drawing { background: #fff; overflow-x: auto; }
        .drawing svg { display: block; max-width: 100%; height: auto; }
        figcaption, footer { font-size: .9rem; }
        @media (max-width: 30rem) { .drawing svg { max-width: none; } }
        @media print {
          @page { size: A4; margin: 18mm; }
          :root { --ink: #000; --paper: #fff; --faint: #bbb; --link: #000; --good: #000; --bad: #000; --shade: #fff; }
          body { max-width: none; padding: 0; font-size: 10pt; }
          nav, .skip { display: none; }
          .wide, .drawing { overflow: visible; }
          table { font-size: 8pt; }
          td.number { white-space: normal; }
          th button::after { content: none !important; }
          figure, tr, h2, h3, .headline { break-inside: avoid; }
          h2, h3, h4, caption { break-after: avoid; }
        }

        """;

    /// <summary>Sorts a table by the column whose heading is pressed, numbers by size; works with mouse and keyboard.</summary>
    public const string Script = """
        for (const button of document.querySelectorAll("th button")) {
          button.addEventListener("click", () => {
            const head = button.parentElement, row = head.parentElement, table = row.closest("table"), body = table.tBodies[0];
            const column = [...row.children].indexOf(head), up = head.getAttribute("aria-sort") !== "ascending";
            const key = line => { const cell = line.children[column]; return cell.dataset.value === undefined ? cell.textContent : Number(cell.dataset.value); };
            const order = (a, b) => typeof a === "number" && typeof b === "number" ? (Number.isNaN(a) ? 1 : Number.isNaN(b) ? -1 : a - b) : String(a).localeCompare(String(b), "en", { numeric: true });
            for (const other of row.children) other.removeAttribute("aria-sort");
            head.setAttribute("aria-sort", up ? "ascending" : "descending");
            [...body.rows].sort((x, y) => (up ? 1 : -1) * order(key(x), key(y))).forEach(line => body.append(line));
          });
        }

        """;
}
