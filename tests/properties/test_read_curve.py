"""The same curve in other words is the same curve; no text makes the reader fail otherwise than by a problem."""

import tempfile
from pathlib import Path

import numpy as np
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from bidcheck.errors import InputError
from bidcheck.numerals import UnreadableNumeral, read_numeral
from bidcheck.quantity import Kind
from bidcheck.read import read_inquiry
from bidcheck.read.curve_columns import COLUMN_KINDS, COLUMN_SPELLINGS
from bidcheck.read.curve_csv import read_curve_csv
from bidcheck.read.source import Source, decode
from bidcheck.units import from_si, spellings
from tests.build_files import BID, CURVE, INQUIRY, write_inquiry

NAMES = tuple(COLUMN_SPELLINGS)


@st.composite
def curves(draw):
    """Rows in SI, flows distinct by more than any rounding used."""
    flows = draw(st.lists(st.integers(0, 2000), min_size=2, max_size=12, unique=True))
    number = st.integers(20, 1000)
    return [[q / 3600, *(draw(number) / scale for scale in (5, 1000, 0.01, 50))] for q in sorted(flows)]


@st.composite
def layouts(draw):
    """Separator, decimal mark, bracket form, spelling and unit of every column, order of columns."""
    separator = draw(st.sampled_from([",", ";", "\t"]))
    mark = "." if separator == "," else draw(st.sampled_from([".", ","]))
    columns = draw(st.permutations(range(len(NAMES))))
    headings = []
    for n in columns:
        kind = COLUMN_KINDS[NAMES[n]]
        unit = draw(st.sampled_from([unit for unit in spellings(kind) if unit != "-"]))
        headings.append((n, draw(st.sampled_from(COLUMN_SPELLINGS[NAMES[n]])), unit, kind))
    form = draw(st.sampled_from(["{} [{}]", "{} ({})", "unit row"] + (["{}, {}"] if separator != "," else [])))
    return separator, mark, headings, form


def written(rows, layout):
    """Text of the curve with nine significant digits."""
    separator, mark, headings, form = layout
    if form == "unit row":
        lines = [[name for _, name, _, _ in headings], [unit for _, _, unit, _ in headings]]
    else:
        lines = [[form.format(name, unit) for _, name, unit, _ in headings]]
    for row in rows:
        lines.append([f"{from_si(row[n], unit, kind):.8e}".replace(".", mark) for n, _, unit, kind in headings])
    return "\n".join(separator.join(line) for line in lines) + "\n"


@settings(deadline=None, max_examples=80)
@given(curves(), layouts(), st.randoms(use_true_random=False))
def test_units_separators_and_order_do_not_matter(rows, layout, random):
    shuffled = list(rows)
    random.shuffle(shuffled)
    source = Source("curve.csv")
    points = read_curve_csv(written(shuffled, layout), source)
    assert source.problems == []
    expected = np.array(rows)
    for column, name in enumerate(NAMES[1:], start=1):
        read = points[name]
        assert np.all(np.abs(read.flow - expected[:, 0]) <= read.flow_half_digit * 1.01 + 1e-15)
        assert np.all(np.abs(read.value - expected[:, column]) <= read.value_half_digit * 1.01 + 1e-12)


@settings(deadline=None, max_examples=60)
@given(st.text(max_size=200) | st.text(alphabet="0123456789.,;\t\n \"'#-e[]()%QHmh/", max_size=200))
def test_no_text_breaks_the_reader(text):
    for whole in (text, "Q [m3/h];H [m];eff [%]\n" + text, "Q [m3/h],H [m]\n" + text):
        source = Source("curve.csv")
        points = read_curve_csv(whole, source)
        assert bool(points) != bool(source.problems)


@settings(deadline=None, max_examples=60)
@given(st.binary(max_size=200))
def test_no_bytes_break_decoding(data):
    try:
        assert "\r" not in decode(data, "x")
    except InputError as error:
        assert len(error.problems) == 1  # noqa: PT017 - either is right


@settings(deadline=None, max_examples=100)
@given(st.text(alphabet="0123456789.,eE+-−' ", max_size=14))
def test_numerals_are_read_or_refused(text):
    try:
        numeral = read_numeral(text)
    except UnreadableNumeral:
        return
    assert np.isfinite(numeral.value)
    assert numeral.half_digit > 0


@settings(deadline=None, max_examples=60)
@given(st.sampled_from([INQUIRY, BID]), st.integers(0, 300), st.integers(0, 40), st.text(max_size=12))
def test_no_damage_to_toml_breaks_the_reader(text, start, length, instead):
    damaged = text[:start] + instead + text[start + length :]
    with tempfile.TemporaryDirectory() as folder:
        root = Path(folder)
        files = (damaged, BID) if text is INQUIRY else (INQUIRY, damaged)
        try:
            write_inquiry(root, *files, CURVE)
        except UnicodeEncodeError:
            return
        try:
            assert read_inquiry(root).bids
        except InputError as error:
            assert all(problem.file and problem.text for problem in error.problems)  # noqa: PT017 - either is right


@pytest.mark.parametrize("kind", [kind for kind in Kind if spellings(kind)])
@given(value=st.floats(1e-6, 1e6))
def test_there_and_back(kind, value):
    from bidcheck.units import to_si

    for unit in spellings(kind):
        assert from_si(to_si(value, unit, kind), unit, kind) == pytest.approx(value, rel=1e-9, abs=1e-9)
