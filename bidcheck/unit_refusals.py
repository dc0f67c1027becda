"""Figures whose unit may mean two things are refused with the cure."""

from bidcheck.errors import UnitError
from bidcheck.numerals import Numeral, clipped
from bidcheck.unit_table import ABSOLUTE, GAUGE, plain_spelling


def refuse_bare_share(text: str, number: str, numeral: Numeral) -> None:
    """A bare number above one is a percentage or a factor, nobody can tell; so is a bare 1."""
    if numeral.value > 1.0 or number == "1":
        as_factor = f"{100.0 * numeral.value:.6g} %" if numeral.value <= 2.0 else f"{numeral.value / 100.0:.6g}"
        raise UnitError(
            f'found "{clipped(text)}", which may be per cent or a fraction; write "{number} %" or "{as_factor}"'
        )


def refuse_other_pressure(text: str, number: str, unit: str, absolute: bool) -> None:
    """Absolute where absolute is needed, never where it is not."""
    plain = plain_spelling(unit).casefold()
    base = next(name for name in ABSOLUTE if plain in ABSOLUTE[name] | GAUGE[name] | {name.casefold()})
    is_absolute = plain in ABSOLUTE[base]
    if is_absolute and not absolute:
        raise UnitError(
            f'found "{clipped(text)}", where gauge pressure is needed; take off air pressure and write {base}(g)'
        )
    if absolute and plain in GAUGE[base]:
        raise UnitError(
            f'found "{clipped(text)}", where absolute pressure is needed; add air pressure and write {base}(a)'
        )
    if absolute and not is_absolute:
        cure = f'write {base}(a), as in "{number} {base}(a)", if it is absolute'
        raise UnitError(f'found "{clipped(text)}", where absolute pressure is needed; {cure}')
