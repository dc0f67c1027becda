"""One table of a TOML file while it is read: every key asked for is known, every other is an error at the end."""

from collections.abc import Mapping, Sequence
from typing import Literal, TypeVar

from bidcheck.errors import UnitError
from bidcheck.numerals import clipped
from bidcheck.quantity import Kind, Stated
from bidcheck.read.nearest import nearest
from bidcheck.read.source import Source
from bidcheck.units import parse, parse_money

Sign = Literal["above zero", "zero or above", "any"]
Word = TypeVar("Word", bound=str)


class Table:
    """A table with its place. Getters return None where the key is absent or wrong; what is wrong is noted."""

    __slots__ = ("_asked", "_subtables", "data", "name", "path", "source")

    def __init__(self, source: Source, data: Mapping[str, object], name: str = "", path: tuple[str | int, ...] = ()):
        self.source = source
        self.data = data
        self.name = name
        self.path = path
        self._asked: set[str] = set()
        self._subtables: list[Table] = []

    def __contains__(self, key: str) -> bool:
        return key in self.data

    def problem(self, key: str, text: str) -> None:
        """Note something wrong with a key."""
        label = f"{self.name} {key}".strip()
        self.source.problem_at((*self.path, key), f"{label}: {text}")

    def require(self, key: str, example: str) -> None:
        """Note a missing key, with an example of how to write it."""
        if key not in self.data:
            label = f"{self.name} {key}".strip()
            self.source.problem_at(self.path, f"{label} is missing; write {key} = {example}")

    def known(self, key: str) -> None:
        """Let a key be known without reading it."""
        self._asked.add(key)

    def quantity(self, key: str, kind: Kind, sign: Sign = "above zero", absolute: bool | None = None) -> Stated | None:
        """A figure with its unit as stated."""
        value = self._get(key)
        if value is None:
            return None
        try:
            stated = parse(self._figure_text(value), kind, absolute=absolute)
        except UnitError as error:
            self.problem(key, str(error))
            return None
        return stated if self._has_sign(key, stated, sign) else None

    def figure(self, key: str, kind: Kind, sign: Sign = "above zero", absolute: bool | None = None) -> float | None:
        """A figure in SI."""
        stated = self.quantity(key, kind, sign, absolute)
        return None if stated is None else stated.value

    def efficiency(self, key: str) -> Stated | None:
        """An efficiency: above zero, at most 100 %."""
        stated = self.quantity(key, Kind.SHARE)
        if stated is not None and stated.value > 1.0:
            self.problem(key, f'found "{stated.text}", an efficiency above 100 %')
            return None
        return stated

    def money(self, key: str, kind: Kind = Kind.MONEY, sign: Sign = "above zero") -> tuple[float, str] | None:
        """An amount or price with its currency."""
        value = self._get(key)
        if value is None:
            return None
        try:
            stated, currency = parse_money(self._figure_text(value), kind)
        except UnitError as error:
            self.problem(key, str(error))
            return None
        return (stated.value, currency) if self._has_sign(key, stated, sign) else None

    def text(self, key: str) -> str | None:
        """A text, not empty."""
        value = self._get(key)
        if value is None:
            return None
        if not isinstance(value, str):
            self.problem(key, f'found {_shown(value)}, text is needed; write {key} = "..."')
            return None
        if not value.strip():
            self.problem(key, "is empty; write a text or delete the key")
            return None
        if any(ord(character) < 32 and character not in "\n\t" for character in value):
            self.problem(key, f'found "{clipped(value)}", which holds control characters; delete them')
            return None
        return value.strip()

    def texts(self, key: str) -> tuple[str, ...]:
        """A list of texts."""
        value = self._get(key)
        if value is None:
            return ()
        if not isinstance(value, list) or not all(isinstance(item, str) for item in value):
            self.problem(key, f'found {_shown(value)}, a list of texts is needed; write {key} = ["..."]')
            return ()
        return tuple(item.strip() for item in value)

    def word(self, key: str, allowed: Sequence[Word]) -> Word | None:
        """One of the allowed words; capitals and doubled spaces are forgiven."""
        text = self.text(key)
        if text is None:
            return None
        plain = " ".join(text.casefold().split())
        for word in allowed:
            if word.casefold() == plain:
                return word
        self.problem(key, f'found "{clipped(text)}"; {nearest(text, allowed)}; write one of: {", ".join(allowed)}')
        return None

    def flag(self, key: str) -> bool | None:
        """True or false."""
        value = self._get(key)
        if value is not None and not isinstance(value, bool):
            self.problem(key, f"found {_shown(value)}; write {key} = true or {key} = false")
            return None
        return value

    def count(self, key: str, at_least: int = 1) -> int | None:
        """A whole number."""
        value = self._get(key)
        if value is None:
            return None
        if isinstance(value, bool) or not isinstance(value, int):
            self.problem(key, f"found {_shown(value)}, a whole number is needed; write {key} = {max(at_least, 1)}")
            return None
        if value < at_least:
            self.problem(key, f"found {value}, must be {at_least} or more")
            return None
        return value

    def table(self, key: str) -> "Table":
        """A table inside; an empty one where it is absent."""
        value = self._get(key)
        name = f"[{self._dotted(key)}]"
        if value is not None and not isinstance(value, dict):
            self.problem(key, f"found {_shown(value)}, a table is needed; write {name} and its keys beneath")
            value = None
        return self._keep(Table(self.source, value or {}, name, (*self.path, key)))

    def tables(self, key: str) -> tuple["Table", ...]:
        """Tables of an array `[[key]]`."""
        value = self._get(key)
        name = f"[[{self._dotted(key)}]]"
        if value is None:
            return ()
        if not isinstance(value, list) or not all(isinstance(item, dict) for item in value):
            self.problem(key, f"found {_shown(value)}, tables are needed; write {name} and its keys beneath, once each")
            return ()
        items = enumerate(value)
        return tuple(self._keep(Table(self.source, item, name, (*self.path, key, n))) for n, item in items)

    def close(self) -> None:
        """Note every key nobody asked for, here and in the tables inside."""
        for key in self.data:
            if key not in self._asked:
                self.problem(clipped(key), f"is not known; {nearest(key, self._asked)}")
        for table in self._subtables:
            table.close()

    def _keep(self, table: "Table") -> "Table":
        """Remember a table for `close`."""
        self._subtables.append(table)
        return table

    def _get(self, key: str) -> object | None:
        """The raw value; the key becomes known."""
        self._asked.add(key)
        return self.data.get(key)

    def _dotted(self, key: str) -> str:
        """Name of a table inside, without counts."""
        return ".".join([*(part for part in self.path if isinstance(part, str)), key])

    def _figure_text(self, value: object) -> str:
        """A figure as text, so that a bare number is told apart by `parse`."""
        if isinstance(value, str):
            return value.strip()
        if isinstance(value, int | float) and not isinstance(value, bool):
            return str(value)
        raise UnitError(f"found {_shown(value)}, a quantity in quotes with its unit is needed")

    def _has_sign(self, key: str, stated: Stated, sign: Sign) -> bool:
        """Whether a figure has the sign asked for; noted where not."""
        wrong = (sign == "above zero" and stated.value <= 0.0) or (sign == "zero or above" and stated.value < 0.0)
        if wrong:
            self.problem(key, f'found "{stated.text}", must be {sign}')
        return not wrong


def _shown(value: object) -> str:
    """A TOML value in a message."""
    if isinstance(value, bool):
        return "true" if value else "false"
    if isinstance(value, dict):
        return "a table"
    if isinstance(value, list):
        return "a list"
    return f'"{clipped(value)}"' if isinstance(value, str) else clipped(str(value))
