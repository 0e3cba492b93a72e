namespace SurveyPlanner.Pages.Look;

/// <summary>The style sheets, made from the tokens: one for all pictures (also inside a lone SVG file), one more for charts, one for the page around them.</summary>
internal static class Stylesheet
{
    /// <summary>Maps, and what charts share with them.</summary>
    public static readonly string Pictures = string.Join('\n',
        ".pic{font-family:" + Tokens.Sans + ";font-size:12px;font-variant-numeric:tabular-nums}",
        $".pic text{{fill:{Tokens.Ink}}}",
        $".pic .paper{{fill:{Tokens.Paper}}}",
        $".pic .ground{{fill:{Tokens.Ground}}}",
        $".pic .edge{{fill:none;stroke:{Tokens.Hairline}}}",
        $".pic .grat{{stroke:{Tokens.Hairline};stroke-width:.7;fill:none}}",
        $".pic .deg{{fill:{Tokens.Muted};paint-order:stroke;stroke:{Tokens.Paper};stroke-width:3px;stroke-linejoin:round}}",
        $".pic .note{{fill:{Tokens.Muted}}}",
        $".pic .region{{stroke:{Tokens.Coast};stroke-width:.9;fill-rule:evenodd;stroke-linejoin:round}}",
        ".pic .outline{fill:none}",
        $".pic .name{{font-size:14px;fill:{Tokens.Muted};paint-order:stroke;stroke:{Tokens.Ground};stroke-width:4px;stroke-linejoin:round}}",
        $".pic .casing{{stroke:{Tokens.Ground};stroke-width:4;fill:none}}",
        $".pic .line{{stroke:{Tokens.Ink};stroke-width:1.5;fill:none}}",
        $".pic .dots .casing{{stroke-width:8;stroke-linecap:round}}",
        $".pic .dots .line{{stroke-width:5;stroke-linecap:round}}",
        $".pic .reach{{stroke:{Tokens.Ink};stroke-width:.7;fill:none}}",
        $".pic .id{{font-weight:600;paint-order:stroke;stroke:{Tokens.Ground};stroke-width:3.2px;stroke-linejoin:round}}",
        $".pic .way{{fill:{Tokens.Signal};stroke:{Tokens.Ground};stroke-width:1.2;paint-order:stroke}}",
        $".pic .hatch{{stroke:{Tokens.Hatch};stroke-width:1.2}}",
        $".pic .ink{{fill:{Tokens.Ink};stroke:{Tokens.Ink};stroke-width:.8}}",
        $".pic .blank{{fill:{Tokens.Ground};stroke:{Tokens.Ink};stroke-width:.8}}",
        $".pic .globe{{fill:{Tokens.StratumFills[0]};stroke:{Tokens.Coast};stroke-width:.9}}",
        $".pic .land{{fill:{Tokens.GlobeLand}}}",
        $".pic .equator{{stroke:{Tokens.Coast};stroke-width:.9;fill:none}}",
        $".pic .here{{fill:none;stroke:{Tokens.Signal};stroke-width:2.2}}");

    /// <summary>Charts, beside the sheet of all pictures.</summary>
    public static readonly string Charts = string.Join('\n',
        $".pic .axis{{stroke:{Tokens.Muted};stroke-width:1;fill:none}}",
        $".pic .band{{fill:{Tokens.Action};fill-opacity:.18}}",
        $".pic .curve{{stroke:{Tokens.Action};stroke-width:2;fill:none;stroke-linejoin:round}}",
        $".pic .curve2{{stroke:{Tokens.Ink};stroke-width:2;fill:none;stroke-dasharray:8 4}}",
        $".pic .curve3{{stroke:{Tokens.Coast};stroke-width:2;fill:none;stroke-dasharray:2 3}}",
        $".pic .curve4{{stroke:{Tokens.Muted};stroke-width:2;fill:none;stroke-dasharray:12 3 2 3}}",
        $".pic .crowd{{stroke:{Tokens.Hairline};stroke-width:1;fill:none}}",
        $".pic .target{{stroke:{Tokens.Muted};stroke-width:1;fill:none}}",
        $".pic .bar{{fill:{Tokens.Action}}}",
        $".pic .class{{fill:{Tokens.StratumFills[0]};stroke:{Tokens.Coast};stroke-width:.9}}",
        $".pic .dot{{fill:{Tokens.Ink};stroke:{Tokens.Ground};stroke-width:2}}");

    /// <summary>The page.</summary>
    public static readonly string Page = string.Join('\n',
        "*{box-sizing:border-box}",
        $"html{{background:{Tokens.Ground};color:{Tokens.Ink};font:16px/1.5 {Tokens.Sans};-webkit-text-size-adjust:100%}}",
        "body{margin:0 auto;padding:32px 20px 64px;max-width:1000px;overflow-wrap:break-word}",
        "h1{font-size:28px;line-height:1.2;margin:0 0 8px;font-weight:600}",
        "h2{font-size:20px;line-height:1.3;margin:48px 0 8px;font-weight:600}",
        "h3{font-size:16px;margin:24px 0 4px;font-weight:600}",
        "p,ul,ol,dl{max-width:70ch;margin:0 0 12px}",
        "ul,ol{padding-left:20px}li{margin-bottom:4px}",
        ".answer{font-size:20px;line-height:1.4}",
        $".quiet{{color:{Tokens.Muted};font-size:14px}}",
        $"a{{color:{Tokens.Action}}}a:focus-visible,[tabindex]:focus-visible{{outline:2px solid {Tokens.Action};outline-offset:2px}}",
        "nav ul{list-style:none;padding:0;display:flex;flex-wrap:wrap;gap:4px 20px;font-size:14px}nav a{display:inline-block;padding:2px 0;min-height:24px}",
        "figure{margin:16px 0}figcaption{font-size:14px;max-width:70ch;margin-top:8px}",
        ".scroll{overflow-x:auto}.scroll svg{display:block;width:100%;min-width:600px;height:auto}",
        ".chart svg{display:block;width:100%;max-width:680px;height:auto}",
        $"table{{border-collapse:collapse;font-size:14px;margin:12px 0 20px;font-variant-numeric:tabular-nums}}",
        "caption{text-align:left;font-weight:600;padding-bottom:4px}",
        $"th,td{{padding:4px 12px 4px 0;text-align:left;vertical-align:top;border-bottom:1px solid {Tokens.Hairline}}}",
        $"thead th{{color:{Tokens.Muted};font-weight:400;vertical-align:bottom;border-bottom:1px solid {Tokens.Muted}}}",
        "tbody th{font-weight:600}",
        "td span{display:inline-block;white-space:nowrap}.num{text-align:right}th:last-child,td:last-child{padding-right:0}",
        "code{font:14px/1.4 ui-monospace,'SF Mono',Consolas,monospace;overflow-wrap:anywhere}",
        $".warning{{border-left:3px solid {Tokens.Signal};padding-left:12px}}.warning b{{color:{Tokens.Signal}}}",
        "dl{display:grid;grid-template-columns:max-content 1fr;gap:4px 20px}dt{font-weight:600}dd{margin:0;min-width:0;overflow-wrap:anywhere}",
        $"details{{margin:12px 0;font-size:14px}}summary{{cursor:pointer;color:{Tokens.Action};min-height:24px}}summary:focus-visible{{outline:2px solid {Tokens.Action};outline-offset:2px}}",
        // On a narrow screen a row becomes a small list, each figure with its own heading: nothing has to be scrolled sideways.
        "@media screen and (max-width:720px){thead{position:absolute;width:1px;height:1px;overflow:hidden;clip-path:inset(50%)}"
            + "td:empty{display:none!important}table,tbody,tr,caption{display:block;width:100%}tr{padding:8px 0;border-bottom:1px solid " + Tokens.Hairline + "}"
            + "th[scope=row],td{display:flex;justify-content:space-between;gap:16px;border:0;padding:1px 0;text-align:right}"
            + "td::before,th[scope=row]::before{content:attr(data-label);color:" + Tokens.Muted + ";font-weight:400;text-align:left}"
            + "dl{display:block}dd{margin-bottom:8px}body{padding:20px 12px}}",
        "@page{margin:15mm 14mm 16mm;@bottom-right{content:\"page \" counter(page) \" of \" counter(pages);font:9pt " + Tokens.Sans + "}}",
        "@media print{html{font-size:10.5pt;-webkit-print-color-adjust:exact;print-color-adjust:exact}body{max-width:none;padding:0}"
            + "nav{display:none}h1{font-size:20pt}h2{font-size:14pt;margin-top:20pt;break-after:avoid}h3,caption{break-after:avoid}"
            + "thead{display:table-header-group}tr,figure,li,table{break-inside:avoid}table.long{break-inside:auto}table{font-size:8.5pt}th,td{padding:2pt 7pt 2pt 0}"
            + ".scroll{overflow:visible}.scroll svg{min-width:0;max-height:160mm}.chart svg{max-width:130mm}a{color:inherit;text-decoration:none}details::details-content{content-visibility:visible;block-size:auto}summary{display:none}}");
}
