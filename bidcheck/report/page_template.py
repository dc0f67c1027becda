"""Templates of the page: everything is escaped that is not marked as markup, a missing name is an error."""

from functools import lru_cache
from importlib.resources import files
from typing import TYPE_CHECKING

from bidcheck.report.format import tied

if TYPE_CHECKING:
    import jinja2


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
