"""Reference pages made from the code itself: the checks, the limits and the methods, each with its source."""

import ast
import importlib
import inspect
import pkgutil
import sys
from collections.abc import Iterator
from types import ModuleType

from bidcheck.checks import ALL
from bidcheck.finding import Check, Verdict
from bidcheck.limits import Limits, limit_names
from bidcheck.quantity import UnitSystem
from bidcheck.report.words import MARK_WORDS, VERDICT_WORDS, limit_in_words

GROUPS = ("as submitted", "duty", "efficiency", "operating region", "suction", "hydraulics", "curve form")


def explanation(check: Check) -> str:
    """The text of a check's file: what is compared, why a buyer cares, what a sound bid looks like."""
    return inspect.cleandoc(sys.modules[check.run.__module__].__doc__ or "")


def headline(check: Check) -> str:
    """First line of the explanation."""
    return explanation(check).split("\n", 1)[0]


def checks_list() -> str:
    """All checks by group, a line each."""
    width = max(len(check.name) for check in ALL)
    lines: list[str] = []
    for group in GROUPS:
        members = [check for check in ALL if check.group == group]
        if members:
            lines += ["", group, *(f"  {check.name:<{width}}  {headline(check)}" for check in members)]
    return "\n".join(lines[1:]) + "\n"


def _verdict_in_words(check: Check) -> str:
    if check.otherwise is Verdict.NO_DATA:
        return "asks for what is missing"
    return f"a miss is a {VERDICT_WORDS[check.otherwise]}, unless the text above or the limit says otherwise"


def check_text(check: Check, limits: Limits, system: UnitSystem) -> str:
    """One check explained, with the limits of a set."""
    lines = [check.name, "", explanation(check), "", f"verdict: {_verdict_in_words(check)}", f"source: {check.source}"]
    if check.limits:
        lines += ["", f"limits ({limits.set_name}):"]
        for name in check.limits:
            limit = getattr(limits, name)
            tail = ", mandatory" if limit.mandatory else ""
            tail += f", a miss is a {limit.missed}" if limit.missed else ""
            lines.append(f"  {name}: {limit_in_words(limit, system)}{tail}")
            lines.append(f"    {limit_names()[name][1]}")
            lines.append(f"    origin: {limit.origin} ({MARK_WORDS[limit.mark]})")
    return "\n".join(lines) + "\n"


def checks_page(sets: tuple[Limits, ...]) -> str:
    """docs/checks.md: every check with its limits in every set shipped."""
    lines = ["# Checks", "", "Made from the code; each check is one file in `bidcheck/checks/`.", ""]
    for group in GROUPS:
        members = [check for check in ALL if check.group == group]
        if not members:
            continue
        lines += [f"## {group[:1].upper()}{group[1:]}", ""]
        for check in members:
            lines += [f"### {check.name}", "", explanation(check), ""]
            lines += [f"Verdict: {_verdict_in_words(check)}. Source: {check.source}.", ""]
            lines += _limits_table(check, sets)
    return "\n".join(lines).rstrip() + "\n"


def _limits_table(check: Check, sets: tuple[Limits, ...]) -> list[str]:
    """The limits a check uses, a row each."""
    if not check.limits:
        return []
    heads = " | ".join(one.set_name for one in sets)
    lines = [f"| limit | what it limits | {heads} | origin |", "|---|---|" + "---|" * len(sets) + "---|"]
    for name in check.limits:
        values = " | ".join(_limit_cell(getattr(one, name)) for one in sets)
        origins = dict.fromkeys(f"{limit.origin} [{limit.mark}]" for limit in (getattr(one, name) for one in sets))
        lines.append(f"| `{name}` | {limit_names()[name][1]} | {values} | {'; '.join(origins)} |")
    return [*lines, ""]


def _limit_cell(limit: object) -> str:
    from bidcheck.limits import Limit

    assert isinstance(limit, Limit)
    words = limit_in_words(limit, UnitSystem.SI)
    if limit.mandatory:
        words += ", mandatory"
    return words + (f", missed: {limit.missed}" if limit.missed else "")


def methods_page() -> str:
    """docs/methods.md: every formula of hydraulics and estimates with its equation, range, source and mark."""
    lines = ["# Methods", "", "Made from the docstrings of `bidcheck/hydraulics/` and `bidcheck/estimates/`.", ""]
    lines += ["| mark | meaning |", "|---|---|"]
    lines += [f"| {mark} | {words} |" for mark, words in MARK_WORDS.items() if mark not in ("purchaser", "bidder")]
    for package in ("bidcheck.hydraulics", "bidcheck.estimates"):
        for module in _modules(package):
            functions = list(_functions(module))
            if functions:
                title = inspect.cleandoc(module.__doc__ or "").split("\n", 1)[0]
                lines += ["", f"## {title.rstrip('.')}", "", f"`{module.__name__}`"]
                lines += [line for name, text in functions for line in _method(name, text)]
    return "\n".join(lines).rstrip() + "\n"


def _modules(package: str) -> Iterator[ModuleType]:
    """Modules of a package by name."""
    parent = importlib.import_module(package)
    for item in sorted(pkgutil.iter_modules(parent.__path__), key=lambda one: one.name):
        yield importlib.import_module(f"{package}.{item.name}")


def _functions(module: ModuleType) -> Iterator[tuple[str, str]]:
    """Public functions of a module with a source, in the order of the file."""
    tree = ast.parse(inspect.getsource(module))
    for node in tree.body:
        if isinstance(node, ast.FunctionDef) and not node.name.startswith("_"):
            text = ast.get_docstring(node) or ""
            if "Source:" in text:
                yield node.name, text


def _method(name: str, text: str) -> list[str]:
    """Summary and notes of one function."""
    summary = text.split("\n", 1)[0]
    notes = text.split("Notes\n-----\n", 1)[1].split("\n\n", 1)[0] if "Notes\n-----\n" in text else ""
    return ["", f"### {name}", "", summary, "", *_paragraphs(notes)]


def _paragraphs(notes: str) -> list[str]:
    """Notes with a list item for each labelled line, continuation lines joined."""
    found: list[str] = []
    for line in notes.split("\n"):
        labelled = line.startswith(("Valid for:", "Source:", "Mark:"))
        if labelled or not found:
            found.append(line)
        else:
            found[-1] += " " + line.strip()
    return [f"- {line}" for line in found if line]
