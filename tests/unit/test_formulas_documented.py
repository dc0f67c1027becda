"""Every public formula says where it comes from, where it holds and how well it is known."""

import importlib
import inspect
import pkgutil
import re

import pytest

import bidcheck.estimates
import bidcheck.hydraulics

HELPERS = {"bidcheck.hydraulics.ranges"}
MARKS = {"text", "crossed", "memory", "practice", "derived"}


def formulas():
    """Public functions of both packages."""
    for package in (bidcheck.hydraulics, bidcheck.estimates):
        for info in pkgutil.iter_modules(package.__path__, package.__name__ + "."):
            if info.name in HELPERS:
                continue
            module = importlib.import_module(info.name)
            for name, function in inspect.getmembers(module, inspect.isfunction):
                if function.__module__ == info.name and not name.startswith("_"):
                    yield function


def gaps(text):
    """What a docstring lacks."""
    lacking = [part for part in ("Returns\n", "Notes\n", "Examples\n") if part not in text]
    for line in ("Source", "Valid for", "Mark"):
        if len(re.findall(rf"^{line}: \S.*$", text, re.MULTILINE)) != 1:
            lacking.append(line)
    mark = re.search(r"^Mark: (\w+)$", text, re.MULTILINE)
    if mark is None or mark.group(1) not in MARKS:
        lacking.append("mark")
    return lacking


@pytest.mark.parametrize("function", list(formulas()), ids=lambda function: function.__name__)
def test_formula_is_documented(function):
    assert gaps(inspect.getdoc(function) or "") == []


def test_a_bare_docstring_is_refused():
    assert "Source" in gaps("Scale head.\n\nReturns\n-------\nNotes\n-----\nMark: guessed\n")
