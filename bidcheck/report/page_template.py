"""Templates of the page: everything is escaped that is not marked as markup, a missing name is an error."""

import re
from functools import lru_cache
from importlib.resources import files
from typing import TYPE_CHECKING

from bidcheck.quantity import KINDS

if TYPE_CHECKING:
    import jinja2

_UNITS = {printed.unit for kind in KINDS.values() for printed in (kind.si, kind.us)} - {""}
_BEFORE_UNIT = re.compile(rf"(?<=\d) (?=(?:{'|'.join(map(re.escape, sorted(_UNITS, reverse=True)))})(?!\w))")


def template(name: str) -> "jinja2.Template":
    """A template of this package by its file name."""
    return _environment().get_template(name)


@lru_cache(maxsize=1)
def _environment() -> "jinja2.Environment":
    """Templates escape everything that is not marked as markup."""
    import jinja2

    environment = jinja2.Environment(
        loader=jinja2.FunctionLoader(lambda name: files("bidcheck.report").joinpath(name).read_text("utf-8")),
        autoescape=True,
        undefined=jinja2.StrictUndefined,
        trim_blocks=True,
        lstrip_blocks=True,
    )
    environment.filters["tied"] = tied
    return environment


def tied(text: str) -> str:
    r"""Text in which no line breaks between a figure and its unit.

    Examples
    --------
    >>> tied("at 520 m³/h for 3 more")
    'at 520\xa0m³/h for 3 more'
    """
    return _BEFORE_UNIT.sub("\u00a0", text).replace("US gpm", "US\u00a0gpm")
