"""One curve on a terminal, without an inquiry: fits, best efficiency, power balance, odd points."""

from statistics import median

from rich.console import Console
from rich.table import Table
from rich.text import Text

from bidcheck.checks.headings import headings_of
from bidcheck.checks.power_balance import balanced_rows
from bidcheck.curve import COLUMN_KINDS, COLUMN_WORDS, COLUMNS, Curve, Fit, Fits, Floats
from bidcheck.explain import BALANCE, closing, frequency_mistakes, in_words
from bidcheck.hydraulics.specific_speed import specific_speed, suction_specific_speed
from bidcheck.quantity import Kind, UnitSystem
from bidcheck.report.format import bare, figure, plain
from bidcheck.report.terminal import print_trimmed


def print_curve(fits: Fits, curve: Curve, console: Console, system: UnitSystem) -> None:
    """Print what one curve shows.

    Parameters
    ----------
    fits : Fits
    curve : Curve
    console : rich Console
    system : UnitSystem
    """
    console.print(Text(plain(curve.file), style="bold"))
    console.print()
    print_trimmed(_fits_table(fits, system), console)
    console.print()
    for line in best_efficiency_lines(fits, system):
        console.print(Text(line))
    for line in odd_lines(fits, curve, system):
        console.print(Text(line))
    _print_balance(fits, curve, console, system)


def _fits_table(fits: Fits, system: UnitSystem) -> Table:
    """Degree, points, range and residuals of each column."""
    table = Table(box=None, pad_edge=False, padding=(0, 2, 0, 0), header_style="bold")
    table.add_column("fitted")
    for heading in ("points", "degree", "from", "to", "rms residual", "largest residual"):
        table.add_column(heading, justify="right")
    for column in COLUMNS:
        fit = fits.of(column)
        if fit is None:
            continue
        name = COLUMN_WORDS[column] + (" (derived)" if fit.derived else "")
        table.add_row(name, str(fit.points), str(fit.degree), *_range(fit, system), *_residuals(fit, system))
    return table


def _range(fit: Fit, system: UnitSystem) -> tuple[str, str]:
    """First and last flow with points."""
    lo, hi = fit.domain
    return figure(lo, Kind.FLOW, system), figure(hi, Kind.FLOW, system)


def _residuals(fit: Fit, system: UnitSystem) -> tuple[str, str]:
    """Residuals, with a digit more than the figures themselves."""
    kind = COLUMN_KINDS[fit.column]
    return _fine(fit.rms, kind, system), _fine(fit.largest_residual, kind, system)


def _fine(value: float, kind: Kind, system: UnitSystem) -> str:
    """A small figure in the unit of its kind, two decimals."""
    if kind is Kind.SHARE:
        return f"{100 * value:.2f} points"
    from bidcheck.units import from_si

    unit = kind.printed(system).unit
    return f"{from_si(value, unit, kind):.2f} {unit}"


def best_efficiency_lines(fits: Fits, system: UnitSystem) -> list[str]:
    """Best efficiency in words, or why there is none."""
    bep = fits.bep
    if bep is not None:
        line = f"best efficiency {figure(bep.efficiency, Kind.SHARE, system)} at {figure(bep.flow, Kind.FLOW, system)}"
        if bep.head is not None:
            line += f", head {figure(bep.head, Kind.HEAD, system)}"
        if bep.flow_interval is not None:
            low, high = bep.flow_interval
            line += f"; 95 % interval of the flow {bare(low, Kind.FLOW, system)} to {figure(high, Kind.FLOW, system)}"
        return [line]
    if fits.bep_beyond is not None:
        last = figure(fits.bep_beyond, Kind.FLOW, system)
        return [f"best efficiency lies beyond the last point, {last}: efficiency still rises there"]
    return ["best efficiency cannot be told: no efficiency, or no maximum inside the points"]


def odd_lines(fits: Fits, curve: Curve, system: UnitSystem) -> list[str]:
    """Odd points in words."""
    name = plain(curve.file.rsplit("/", 1)[-1])
    lines = []
    for odd in fits.odd_points:
        kind = COLUMN_KINDS[odd.column]
        lines.append(
            f"odd point: {COLUMN_WORDS[odd.column]} {figure(odd.value, kind, system)} at"
            f" {figure(odd.flow, Kind.FLOW, system)} ({name}, line {odd.line}); {figure(odd.would_fit, kind, system)}"
            " would fit; left out of the fit"
        )
    return lines


def _print_balance(fits: Fits, curve: Curve, console: Console, system: UnitSystem) -> None:
    """Power balance point by point, and the mistake that would close a gap in the middle of all points."""
    if curve.head is None or curve.efficiency is None or curve.power is None:
        console.print(Text("power balance: needs head, efficiency and power at the same flows"))
        return
    lines, flows, gaps, tolerances = balanced_rows(curve, set())
    if not flows.size:
        console.print(Text("power balance: needs head, efficiency and power at the same flows"))
        return
    odd = {point.line for point in fits.odd_points}
    sound = [float(gap) for line, gap in zip(lines, gaps, strict=True) if int(line) not in odd] or gaps.tolist()
    middle, allowed = median(sound), float(median(tolerances.tolist()))
    mistakes = closing(middle, BALANCE, frequency_mistakes(), headings_of(curve))
    if abs(middle - 1.0) <= allowed:
        verdict = "power balance: head, power and efficiency agree within the printed digits"
    else:
        verdict = f"power balance: ρgQH/P comes to {figure(middle, Kind.SHARE, system)} of the stated efficiency; "
        verdict += f"it looks as if {in_words(mistakes)}" if mistakes else "no single mistake explains it"
    console.print(Text(verdict))
    console.print()
    print_trimmed(_balance_table(flows, gaps, tolerances, system), console)


def _balance_table(flows: Floats, gaps: Floats, tolerances: Floats, system: UnitSystem) -> Table:
    """A row for each point where all four figures stand."""
    table = Table(box=None, pad_edge=False, padding=(0, 2, 0, 0), header_style="bold")
    for heading in ("flow", "ρgQH/P over stated efficiency", "printed digits allow"):
        table.add_column(heading, justify="right")
    table.add_column("")
    for flow, gap, tolerance in zip(flows, gaps, tolerances, strict=True):
        off = abs(float(gap) - 1.0) > float(tolerance)
        table.add_row(
            figure(float(flow), Kind.FLOW, system),
            figure(float(gap), Kind.SHARE, system),
            "±" + figure(float(tolerance), Kind.SHARE, system),
            "off" if off else "",
        )
    return table


def specific_speed_lines(fits: Fits, speed_rpm: float, stages: int, system: UnitSystem) -> list[str]:
    """Specific speed and suction specific speed at best efficiency, one suction eye; empty where there is none."""
    bep = fits.bep
    if bep is None or bep.head is None or bep.head <= 0:
        return []
    nq = specific_speed(speed_rpm, bep.flow, bep.head / stages)
    lines = [f"specific speed {figure(nq, Kind.SPECIFIC_SPEED, system)} per stage, total flow"]
    if fits.npsh3 is not None and fits.npsh3.covers(bep.flow) and fits.npsh3.at(bep.flow) > 0:
        nss = suction_specific_speed(speed_rpm, bep.flow, fits.npsh3.at(bep.flow))
        lines.append(f"suction specific speed {figure(nss, Kind.SUCTION_SPECIFIC_SPEED, system)}, one suction eye")
    return lines
