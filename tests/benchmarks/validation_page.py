"""docs/validation.md and its figure, from what the studies found."""

import io
from collections.abc import Iterator
from math import log
from pathlib import Path
from statistics import fmean, stdev

import numpy as np

from bidcheck.errors import OutOfRange
from bidcheck.estimates.attainable import chart_efficiency
from bidcheck.estimates.context import corripio_efficiency
from bidcheck.estimates.efficiency import estimate_efficiency
from bidcheck.estimates.expected import CLASS_OFFSET, table_efficiency
from bidcheck.estimates.guelich import guelich_single_stage
from bidcheck.estimates.market_surface import ESOB_1450, ESOB_2900, MARKET_CLASSES, market_efficiency, market_median
from bidcheck.estimates.us_rule import M3S_PER_GPM, US_CONSTANTS, us_minimum_efficiency
from bidcheck.hydraulics.specific_speed import specific_speed, specific_speed_us
from bidcheck.second_opinion import EfficiencyEstimate
from tests.benchmarks.peers_study import COMMON, ERROR, INQUIRIES, peers_study
from tests.benchmarks.validation_pumps import Population
from tests.benchmarks.validation_study import (
    COUNT,
    FINGERPRINTED,
    POPULATIONS,
    RAISED,
    SEED,
    TABLED,
    Judged,
    fingerprint,
    grouped,
    shares,
    single_stage,
)

Found = dict[Population, list[Judged]]
TITLES: dict[Population, str] = {
    "market": "Merit drawn from the surveyed market, cut off at the attainable efficiency",
    "median": "Merit in the middle of the market, only the error of the estimate (2.2 points)",
    "table": "Truth from Gülich's table, nothing of the survey in it",
}
HEAD = ["", "pumps", "asked though honest", *(f"+{points:g} points" for points in TABLED[1:])]


def write_page(found: Found, folder: Path) -> None:
    """Write validation.md and validation.svg."""
    (folder / "validation.svg").write_text(figure(found), encoding="utf-8")
    (folder / "validation.md").write_text(page(found), encoding="utf-8")


def page(found: Found) -> str:
    """The page."""
    parts = [
        _opening(found),
        _spreads(),
        "## Published figures\n",
        table(["figure", "published", "computed", "source"], list(published_rows())),
        _duties(),
        _pumps(),
        "## The sources against one another\n",
        _against(),
        "## Honest and overstated pumps\n",
        _study_words(),
        *(_population(found[population], population) for population in POPULATIONS),
        _peers(),
        _limits(),
        f"\nFingerprint of the first {FINGERPRINTED} pumps of each population: {_fingerprints(found)}.\n",
    ]
    return "\n".join(parts).rstrip() + "\n"


def table(head: list[str], rows: list[list[str]]) -> str:
    """A table in Markdown."""
    lines = ["| " + " | ".join(head) + " |", "|" + "---|" * len(head)]
    return "\n".join([*lines, *("| " + " | ".join(row) + " |" for row in rows)]) + "\n"


def _opening(found: Found) -> str:
    single = shares(single_stage(found["median"]))
    market = shares(single_stage(found["market"]))
    return f"""# How far the estimates of efficiency can be trusted

Made by one command, from a fixed seed, and never edited by hand:

```bash
.venv/bin/python -m tests.benchmarks.validation_study
```

In one look, single-stage pumps from 65 to 3300 m³/h, share of bids asked about by the efficiency checks, in per cent:

{
        table(
            ["spread of the pumps drawn", *HEAD[1:]],
            [["merit of the whole market", *market], ["middle of the market, error of the estimate only", *single]],
        )
    }
An overstatement of 3 points cannot be shown by any such estimate, 5 points seldom. 8 points are mostly found, 10 nearly
always, where the middle of the market lies near what is attainable: end suction and double suction pumps at four poles
or slower, large ones above all. Where the two lie far apart – in-line pumps, small pumps, pumps at 2900 and 3500 rpm –
8 and even 10 points can hide between them, and only a test or the other bids tell.

Of the honest single-stage pumps asked about in the first row, {_low(found["market"])} are asked because they are very
low: the worst of the market are, by the rule, and the question there is what the figure includes.
"""


def _low(rows: list[Judged]) -> str:
    """How many of the honest single-stage pumps asked about are asked for being low."""
    asked = [row for row in single_stage(rows) if row.asked(0.0)]
    return f"{sum(row.low for row in asked)} of {len(asked)}"


def _spreads() -> str:
    return """## Two spreads that must not be confused

- **Spread of merit**: how far pumps on the market differ from one another at the same size and specific speed. The
  regulation's two published constants give a standard deviation of 4.1 to 5.6 points by class. It says how unusual a
  pump is; it does not say that an unusual pump is a false claim.
- **Error of the estimate**: how far the middle of the market, as the sources give it, lies from an honest pump of
  ordinary merit; about 1.6 to 2.7 points above 60 m³/h. It says how sharp the ruler is.

A good pump may honestly lie 5 points above the middle. That is why a claim is asked about only above what the published
chart calls practically attainable, and why a claim between the two is a remark.

![Left: the two spreads, and the steps a claim is held against. Right: share asked about.](validation.svg)
"""


def published_rows() -> Iterator[list[str]]:
    """Published figures beside what the program gives."""
    eu = "Regulation (EU) No 547/2012, Annex III, worked by hand"
    us = "10 CFR 431.464, worked by hand"
    book = "Gülich, Centrifugal Pumps, Table 3.9"
    chart = "Hydraulic Institute chart, read by pixel to 0.3"
    pump = market_efficiency
    yield [
        "end suction 1450 rpm, nq 30, 100 m³/h, index 0.40",
        "78.45 %",
        _per(pump(ESOB_1450, 0.4, 30, 100 / 3600)),
        eu,
    ]
    yield ["end suction 2900 rpm, nq 20, 25 m³/h, index 0.10", "57.62 %", _per(pump(ESOB_2900, 0.1, 20, 25 / 3600)), eu]
    least = us_minimum_efficiency("ESFM", 1800, 1500 / 51.645, 400 * M3S_PER_GPM)
    yield ["frame mounted 1800 rpm, Ns 1500, 400 US gpm", "75.965 %", _per(least, 3), us]
    yield ["single stage, nq 36.2, 0.2778 m³/s", "88.13 %", _per(guelich_single_stage(36.2, 0.2778)), book]
    for nq, flow, reading in ((20, 360, 82.6), (30, 36, 80.5), (40, 1800, 91.3), (60, 18000, 93.0)):
        yield [f"attainable, nq {nq}, {flow} m³/h", f"{reading} %", _per(chart_efficiency(nq, flow / 3600), 1), chart]
    gpm = 461 * M3S_PER_GPM
    yield ["by flow alone, 461 US gpm", "70.59 %", _per(corripio_efficiency(gpm)), "PyPI `fluids` 1.3.1"]
    shape = 3.65 * specific_speed(1470, 800 / 3600 / 2, 12.0)
    yield ["n_s' of 800 m³/h, 12 m, 1470 rpm, double suction", "277.4", f"{shape:.1f}", "GB 19762-2007, Annex A"]


def _per(value: float, digits: int = 2) -> str:
    return f"{100 * value:.{digits}f} %"


DUTIES = (
    ("a", "end suction", 130.0, 55.0, 2960.0, 1, 1, "77.8", "80.8", "85.0", "92.0", "88.7"),
    ("b", "end suction", 1000.0, 60.0, 1480.0, 1, 1, "86.1", "88.1", "90.5", "93.6", "92.8"),
    ("c", "vertical multistage", 60.0, 300.0, 2950.0, 6, 1, "65.8", "73.2", "78.3", "89.2", "83.7"),
    ("d", "double suction", 5000.0, 20.0, 590.0, 1, 2, "out of range", "90.6", "92.2", "95.1", "94.1"),
)
"""Four duties: m³/h, m, rpm, stages, eyes; the figures of the sources as worked out outside the program."""


def duty_estimate(duty: tuple[object, ...]) -> EfficiencyEstimate:
    """Estimate of one of the four duties, impeller of the optimum head coefficient."""
    from bidcheck.estimates.head_coefficient import diameter_for_head, optimum_head_coefficient

    _, arrangement, flow, head, speed, stages, eyes = duty[:7]
    q, per_stage = float(flow) / 3600, float(head) / int(stages)  # type: ignore[arg-type, call-overload]
    nq = specific_speed(speed, q, per_stage)  # type: ignore[arg-type]
    nq_eye = nq / int(eyes) ** 0.5  # type: ignore[call-overload]
    return estimate_efficiency(
        arrangement=arrangement,  # type: ignore[arg-type]
        nq=nq,
        nq_eye=nq_eye,
        flow=q,
        head_per_stage=per_stage,
        speed_rpm=speed,  # type: ignore[arg-type]
        stages=stages,  # type: ignore[arg-type]
        suction_eyes=eyes,  # type: ignore[arg-type]
        diameter=diameter_for_head(per_stage, speed, optimum_head_coefficient(nq_eye)),  # type: ignore[arg-type]
    )


def _duties() -> str:
    rows = []
    for duty in DUTIES:
        estimate = duty_estimate(duty)
        book = next(source.value for source in estimate.sources if source.name.startswith("statistics by size"))
        computed = (estimate.market_median, book, estimate.attainable, estimate.ceiling, estimate.implausible_above)
        figures = [
            f"{wanted} / {'–' if value is None else f'{100 * value:.1f}'}"
            for wanted, value in zip(duty[7:], computed, strict=True)
        ]
        words = f"{duty[2]:g} m³/h, {duty[3]:g} m, {duty[4]:g} rpm, {duty[5]} stage{'s' if duty[5] != 1 else ''}"
        rows.append([f"{duty[0]}: {words}, {duty[1]}", *figures])
    head = ["duty", "market median", "Gülich", "attainable", "ceiling", "implausible above"]
    return f"""Four duties, each source worked out outside the program and by it, in per cent:

{table(head, rows)}
The ceiling of duty d is 94.4 where disc friction is referred to the flow of one eye; an impeller has two outer sides
whatever its eyes, so the program refers it to total flow.
"""


PUMPS = (
    ("example curve of the Hydraulic Institute data library, four poles at 60 Hz assumed", 900.0, 155.0, 1770.0, 78.0),
    ("laboratory pump of 9 in, Munson, Young and Okiishi (from memory)", 110.0, 74.0, 1750.0, 61.0),
)
"""Published pumps, end suction: US gpm, ft, rpm, best efficiency in per cent."""


def _pumps() -> str:
    rows = []
    for name, gpm, feet, speed, published in PUMPS:
        flow, head = gpm * M3S_PER_GPM, feet * 0.3048
        nq = specific_speed(speed, flow, head)
        found = estimate_efficiency(
            arrangement="end suction", nq=nq, nq_eye=nq, flow=flow, head_per_stage=head, speed_rpm=speed
        )
        assert found.expected is not None
        assert found.attainable is not None
        words = f"{gpm:g} US gpm, {feet:g} ft, nq {nq:.0f}"
        rows.append([name, words, f"{published:g}", f"{100 * found.expected:.1f}", f"{100 * found.attainable:.1f}"])
    head_row = ["published pump", "best efficiency point", "published", "expected", "attainable"]
    return f"Pumps with a published best efficiency, in per cent:\n\n{table(head_row, rows)}"


def _grid() -> Iterator[tuple[float, float]]:
    """Specific speed and flow [m³/s], even in their logarithms: nq 12 to 75, 18 to 1000 m³/h."""
    for x in np.linspace(log(12.0), log(75.0), 15):
        for y in np.linspace(log(18.0), log(1000.0), 15):
            yield float(np.exp(x)), float(np.exp(y)) / 3600.0


def _row(name: str, differences: list[float]) -> list[str]:
    values = [100 * one for one in differences]
    return [
        name,
        f"{fmean(values):+.1f}",
        f"{stdev(values):.1f}",
        f"{min(values):+.1f} to {max(values):+.1f}".replace("-", "−"),
    ]


def _against() -> str:
    rows = []
    for one in MARKET_CLASSES:
        multistage = one.name.startswith(("vertical", "submersible"))
        grid = [(nq, q) for nq, q in _grid() if not multistage or (nq <= 60 and q <= 200 / 3600)]
        differences = [table_efficiency(nq, q, multistage) - market_median(one, nq, q) for nq, q in grid]
        rows.append(_row(f"Gülich less market median, {one.name}", differences))
    chart = [chart_efficiency(nq, q) - market_median(ESOB_1450, nq, q) for nq, q in _grid()]
    rows.append(_row("attainable (chart) less market median, end suction 1450 rpm", chart))
    rows.append(_row("attainable (chart) less Gülich, single stage", list(_chart_less_book())))
    rows.append(_row("United States less European surface at equal constant", list(_us_less_eu())))
    offsets = ", ".join(f"{100 * value:.1f}" for value in CLASS_OFFSET.values())
    return f"""Points, over nq 12 to 75 and 18 to 1000 m³/h (multistage nq 12 to 60, to 200 m³/h):

{table(["difference", "mean", "standard deviation", "range"], rows)}
The standard deviations are what the sources disagree by once their mean distance is taken out; the program takes out
{offsets} points in the order of the classes above.
The survey's surface peaks near 1030 m³/h (nq 80) to 1500 m³/h (nq 15) and then falls, which pumps do not: it serves to
1000 m³/h only. Read-off accuracy of the chart is 0.3 points, its fit 0.26 points root mean square and 0.72 at worst.
"""


def _chart_less_book() -> Iterator[float]:
    for nq, q in _grid():
        yield chart_efficiency(nq, q) - guelich_single_stage(nq, q)


def _us_less_eu() -> Iterator[float]:
    """Both surfaces at one constant; the flow at 60 Hz is 1.2 times that at 50 Hz."""
    constant = US_CONSTANTS["ESFM", 1800]
    shift = constant - ESOB_1450.c40
    for nq, q in _grid():
        try:
            us = us_minimum_efficiency("ESFM", 1800, specific_speed_us(nq) / 51.645, 1.2 * q)
        except OutOfRange:
            continue
        yield us + shift / 100.0 - market_efficiency(ESOB_1450, 0.40, nq, q)


def _study_words() -> str:
    return f"""{COUNT} pumps of each population, of nine kinds in turn; flow even in its logarithm, specific speed even
from 12 to 70 per eye, 50 and 60 Hz; 8 to 13 points read with 0.1 to 0.4 % of scatter and printed to three digits. The
whole line judges each pump as it is and with its best efficiency raised, shaft power lowered to agree. The tables give
the share that ends in a query or a fail of efficiency-claim, efficiency-ceiling or efficiency-shape, in per cent; in
brackets the number of honest pumps.

The first two populations take their centre from the sources the estimate itself rests on. They show what the rule does
when the sources are right about the middle; they do not prove the sources. The third takes nothing from the survey:
there the estimate is too low by what the sources differ, so more is found and more honest pumps are asked about.
"""


def _population(rows: list[Judged], population: Population) -> str:
    parts = [f"### {TITLES[population]}\n"]
    lines = [["all", *shares(rows)], ["single stage, 65 to 3300 m³/h", *shares(single_stage(rows))]]
    for group in grouped(rows).values():
        lines += [[name, *shares(members)] for name, members in group.items()]
    parts.append(table(HEAD, lines))
    return "\n".join(parts)


def _peers() -> str:
    rows = [
        [str(one.bids), f"{100 * one.honest:.1f}", f"{100 * one.eight:.1f}", f"{100 * one.ten:.1f}"]
        for one in peers_study(SEED)
    ]
    head = ["bids", "some honest bid called ahead", "one overstated by 8 points found", "by 10 points"]
    return f"""## The other bids

{INQUIRIES} inquiries of each size, distances from the bids' own expectations drawn with {100 * ERROR:.1f} points
for each bid and {100 * COMMON:.1f} points that all bids share, which the comparison takes out. A bid 6 points ahead of
the middle of the others is remarked on; share of inquiries in per cent:

{table(head, rows)}
"""


def _limits() -> str:
    return """## What cannot be detected

- An overstatement of 3 points, by any estimate of this kind; 5 points in most cases.
- Below 18 m³/h there is no attainable efficiency, so nothing is asked on the high side short of what the losses forbid.
- A poor pump made to look ordinary: a pump 5 points below the middle that claims 5 points more is the middle.
- In-line and other pumps whose market lies far below the attainable efficiency: 8 points fit between the two.
- Solids-handling, vertical turbine and sealless pumps have no expectation of their own; only the attainable efficiency
  and the ceiling judge them.
- Multistage pumps: the forms of the sources for them are from memory or reach to 100 to 200 m³/h only.
- An efficiency stated with the motor's losses in it looks like a poor pump; that it would explain the gap is said, that
  it is so cannot be.
- A curve whose head, power and efficiency agree and whose efficiency is 3 points too high costs the buyer 3 points for
  the life of the pump. Only a test with a guarantee finds it.
"""


def _fingerprints(found: Found) -> str:
    return ", ".join(f"{name} `{fingerprint(found[name][:FINGERPRINTED])}`" for name in POPULATIONS)


def figure(found: Found) -> str:
    """The two spreads for one pump, and the share asked about by overstatement. SVG text."""
    import matplotlib
    from matplotlib.figure import Figure

    settings = {"svg.hashsalt": "validation", "svg.fonttype": "none", "font.family": "sans-serif", "font.size": 9}
    with matplotlib.rc_context(settings):
        drawn = Figure(figsize=(11.0, 4.4), layout="constrained")
        left, right = drawn.subplots(1, 2)
        _draw_spreads(left)
        _draw_shares(right, found)
        for axes in (left, right):
            axes.spines["top"].set_visible(False)
            axes.spines["right"].set_visible(False)
        out = io.StringIO()
        drawn.savefig(out, format="svg", metadata={"Date": None, "Creator": None})
    return out.getvalue()


def _draw_spreads(axes: "matplotlib.axes.Axes") -> None:  # type: ignore[name-defined]  # noqa: F821
    """Densities of merit and of the error, and the steps of the ladder."""
    estimate = estimate_efficiency(
        arrangement="end suction", nq=27.85, nq_eye=27.85, flow=130 / 3600, head_per_stage=55.0, speed_rpm=2960
    )
    assert estimate.expected is not None
    assert estimate.sigma is not None
    x = np.linspace(48.0, 98.0, 500)
    for spread, colour, line, words in (
        (100 * estimate.sigma, "#1b4f72", "-", "spread of merit on the market"),
        (2.2, "#b9531a", "--", "error of the estimate"),
    ):
        y = np.exp(-0.5 * ((x - 100 * estimate.expected) / spread) ** 2) / spread
        axes.plot(x, y, color=colour, linestyle=line, linewidth=1.8, label=words)
    top = 0.62
    steps = (
        ("query", estimate.query_below),
        ("remark", estimate.remark_below),
        ("expected", estimate.expected),
        ("remark", estimate.remark_above),
        ("query: attainable", estimate.attainable),
        ("implausible", estimate.implausible_above),
        ("fail: ceiling", estimate.ceiling),
    )
    for words, value in steps:
        if value is not None:
            axes.axvline(100 * value, color="#777777", linewidth=0.8)
            axes.text(100 * value - 0.3, top, words, rotation=90, va="top", ha="right", fontsize=8)
    axes.set_ylim(0.0, top)
    axes.set_xlim(48.0, 98.0)
    axes.set_xlabel("best efficiency claimed [%]: end suction, 2960 rpm, 130 m³/h, nq 28")
    axes.set_yticks([])
    axes.legend(loc="center left", bbox_to_anchor=(0.0, 0.66), framealpha=1.0, edgecolor="none")


def _draw_shares(axes: "matplotlib.axes.Axes", found: Found) -> None:  # type: ignore[name-defined]  # noqa: F821
    """Share asked about by points of overstatement, single-stage pumps of 65 to 3300 m³/h."""
    looks = (("market", "#1b4f72", "-", "o"), ("median", "#b9531a", "--", "s"), ("table", "#1e7a5a", "-.", "^"))
    words = {"market": "merit of the whole market", "median": "error of the estimate only", "table": "Gülich's table"}
    for name, colour, line, marker in looks:
        rows = single_stage(found[name])  # type: ignore[index]
        y = [100 * sum(row.asked(points) for row in rows) / len(rows) for points in RAISED]
        axes.plot(RAISED, y, color=colour, linestyle=line, marker=marker, markersize=4, label=words[name])
    axes.set_ylim(0.0, 102.0)
    axes.set_xlim(-0.2, max(RAISED) + 0.2)
    axes.set_xlabel("overstatement of best efficiency [points], single stage, 65 to 3300 m³/h")
    axes.set_ylabel("bids asked about [%]")
    axes.grid(True, color="#dddddd", linewidth=0.6)
    axes.legend(loc="upper left", frameon=False)
