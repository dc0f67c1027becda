import numpy as np
import pytest

from bidcheck.errors import InputError
from bidcheck.read import curve_csv, read_curve_file
from bidcheck.read.curve_csv import read_curve_csv
from bidcheck.read.source import Source


def read(text):
    """Points of a text without problems."""
    source = Source("curve.csv")
    points = read_curve_csv(text, source)
    assert source.problems == []
    return points


def problems(text):
    """Problems of a text, as printed."""
    source = Source("curve.csv")
    assert read_curve_csv(text, source) == {}
    return [str(problem) for problem in source.problems]


PLAIN = "flow [m3/h], head [m], efficiency [%]\n0, 74.0, 0\n360, 60.5, 82.5\n"


@pytest.mark.parametrize(
    "text",
    [
        PLAIN,
        "Q (m³/h);TDH (m);η (%)\n0;74,0;0\n360;60,5;82,5\n",
        "Q\tH\teff\nm3/h\tm\t%\n0\t74.0\t0\n360\t60.5\t82.5\n",
        "Q\tH\teff\n[m3/h]\t(m)\t[%]\n0\t74.0\t0\n360\t60.5\t82.5\n",
        "capacity, m3/h;Total Head, m;Pump Efficiency, fraction\n0;74.0;0\n360;60.5;0.825\n",
        '"flow, m3/h","head, m","eta, %"\n0,74.0,0\n360,"60.5",82.5\n',
        "# comment\n\nFLOW_RATE [M3/H], Differential-Head [M], EFF. [%]\n\n360, 60.5, 82.5\n# more\n0, 74.0, 0\n",
        "sep=;\nflow [m3/h];head [m];efficiency [%]\n0;74;0\n360;60.5;82.5;\n;;\n",
        "flow [m3/h], head [m], #note, efficiency [%]\n0, 74.0, as tested, 0\n360, 60.5, n/a, 82.5\n",
        "flow [m3/h], head [m], efficiency [%]\n0, 74.0, 0\n360, 60.5, 82.5\n360, 60.50, 82.5\n",
    ],
)
def test_forms_of_one_curve(text):
    points = read(text)
    assert list(points) == ["head", "efficiency"]
    assert points["head"].flow == pytest.approx([0.0, 0.1])
    assert points["head"].value == pytest.approx([74.0, 60.5])
    assert points["efficiency"].value == pytest.approx([0.0, 0.825])


def test_digits_lines_and_blanks():
    points = read("flow [l/s], head [ft], npsh3 [m]\n# x\n100.0, 200,\n50, 210.5, 2.10\n75.0,, 3.0\n")
    head, npsh3 = points["head"], points["npsh3"]
    assert head.line.tolist() == [4, 3]
    assert npsh3.line.tolist() == [4, 5]
    assert head.flow_half_digit == pytest.approx([0.0005, 0.00005])
    assert head.value_half_digit == pytest.approx([0.05 * 0.3048, 0.5 * 0.3048])
    assert npsh3.value_half_digit == pytest.approx([0.005, 0.05])
    assert np.all(np.diff(head.flow) > 0)


def test_a_column_left_blank_is_not_supplied():
    assert list(read("flow [m3/h], head [m], npsh3 [m]\n0, 74, \n100, 70,\n")) == ["head"]


def test_decimal_comma_with_three_places():
    assert read("Q [m3/h];H [m]\n1,125;48,2\n2;47\n")["head"].flow == pytest.approx([1.125 / 3600, 2 / 3600])


@pytest.mark.parametrize(
    ("header", "message"),
    [
        (
            "flow [m3/h], hed [m]",
            'column "hed [m]" is not known; nearest is "head"; delete it, or put # before its name',
        ),
        ("flow [m3/h], colour", 'column "colour" is not known; known are flow, head, efficiency, power, npsh3'),
        ("flow [m3/h], head [bar]", 'column "head [bar]": unit "bar" belongs to pressure, not to head'),
        ("flow [m3/h], head m", 'column "head m" has its unit without brackets; write "head [m]"'),
        ("flow, m3/h, head, m", 'column "m3/h" is a unit without a name; write name and unit in one cell'),
        ("flow [m3/h], P1 [kW]", 'is motor input; name it power and write power_at = "motor input" in [[curves]]'),
        ("flow [m3/h], head [m], H [m]", 'columns "head [m]" and "H [m]" are all head; keep one of them'),
        ("head [m], power [kW]", "there is no column of flow"),
        ("flow [m3/h], #head [m]", "there is no column beside flow"),
        ("flow [m3/h], bhp", 'column "bhp" has no unit; write "bhp [kW]" or a row of units beneath the header'),
    ],
)
def test_header_refused(header, message):
    (problem,) = [text for text in problems(f"# x\n{header}\n1, 2, 3\n4, 5, 6\n") if message in text]
    assert problem.startswith("curve.csv:2: ")


@pytest.mark.parametrize(
    ("text", "message"),
    [
        ("Q;H\nm3/h;yd\n0;1\n", ':2: column "H": unit "yd" is not known for head'),
        ("Q;H\nm3/h;\n0;1\n", ':1: column "H" has no unit'),
        ("Q [l/s];H\nm3/h;m\n0;1\n", ':2: column "Q [l/s]" has another unit, "m3/h", in the row beneath'),
        ("0, 74\n1, 60\n", ":1: the first line must be a header"),
        ("", ": is empty"),
        ("# only\n\n", ": is empty"),
        ("flow [m3/h], head [m]\n", ": has a header but no points"),
        ("flow [m3/h], head [m]\n,\n1,\n2,\n", ": has no figures beneath its header"),
        ('flow [m3/h], head [m]\n1, "60\n', ":2: has a quotation mark"),
        ("flow [m3/h], head [m]\n1, " + "6" * 140_000, ":2: has a cell far too long"),
        ("flow [m3/h], head [m]\n1, " + "6" * 100, ':2: head "' + "6" * 57 + '..." is not a number of ordinary size'),
        ("flow [m3/h], head [m]\n1, 60\n", ":2: column head has one point at one flow only"),
    ],
)
def test_files_refused(text, message):
    assert any(message in problem for problem in problems(text))


@pytest.mark.parametrize(
    ("row", "message"),
    [
        (
            '450, "48,2", 80',
            'head "48,2" has a decimal comma but columns are also separated by commas; '
            "separate the columns with ; or write 48.2",
        ),
        ("450, 48,2, 80,1", "has 5 cells, the header 3; if it has decimal commas, separate the columns with ;"),
        ("450, n/a, 80", 'head "n/a" is not a number; leave the cell blank where there is no figure'),
        ("450, -, 80", 'head "-" is not a number; leave the cell blank'),
        ("450, nan, 80", 'head "nan" is not a number'),
        ("450, inf, 80", 'head "inf" is not a number'),
        ("450, 48 m, 80", 'head "48 m" is not a number; a cell holds the number only, the unit stands in the header'),
        ("1 450, 48, 80", 'flow "1 450" has a thousands mark; write 1450'),
        ("450, -48, 80", 'head "-48" is negative'),
        ("-450, 48, 80", 'flow "-450" is negative'),
        ("450, 48, 101", 'efficiency "101" is above 100 %'),
        (", 48, 80", "flow is blank but other figures are given"),
        ("360, 61.5, 82.5", 'head is "61.5" here and "60.5" in line 3, both at flow 360; keep one of them'),
    ],
)
def test_rows_refused(row, message):
    (problem,) = problems(PLAIN + row + "\n")
    assert problem == f"curve.csv:4: {message}" or problem.startswith(f"curve.csv:4: {message}")


@pytest.mark.parametrize(
    ("text", "message"),
    [
        (
            "Q [m3/h];H [m]\n0;74,5\n100;70.5\n",
            ':3: has a decimal comma in "74,5" (line 2) and a decimal point in "70.5"',
        ),
        ("Q [m3/h];H [m]\n800;74\n1.000;70\n", ':3: flow "1.000" may be 1000 or 1.000'),
        ("Q [m3/h];H [m]\n800;74\n1,000;70\n", ':3: flow "1,000" may be 1000 or 1.000'),
        ("Q [m3/h];H [m]\n0;74\n1,200;70\n", ':3: flow "1,200" can be read in two ways; write 1200 or 1.200'),
        ("Q [m3/h];H [m];\n0;74;x\n1;70;\n", ':2: cell "x" stands in a column without a heading'),
        ("Q [m3/h];H [m]\n0;74;5\n1;70\n", ":2: has 3 cells, the header 2; delete what has no heading"),
        ("Q [m3/h];eff [%]\n0;0\n1;0.8\n2;0.82\n", ":2: efficiency is headed per cent but never exceeds 1"),
        (
            "Q [m3/h];eff [fraction]\n0;0\n1;80\n",
            ':3: efficiency "80" is above 1 but the column is headed as a fraction',
        ),
    ],
)
def test_ambiguity_is_refused(text, message):
    found = problems(text)
    assert any(message in problem for problem in found), found


def test_efficiency_just_inside():
    assert read("Q [m3/h];eff [%]\n0;0\n1;100\n")["efficiency"].value[-1] == 1.0
    assert read("Q [m3/h];eff [%]\n0;0\n1;5\n")["efficiency"].value[0] == 0.0


def test_all_problems_at_once():
    found = problems(PLAIN + "1, n/a, 80\n2, 48, 120\nx, 1, 1\n")
    assert [problem.split(":")[1] for problem in found] == ["4", "6", "5"]


def test_row_limit(monkeypatch):
    monkeypatch.setattr(curve_csv, "MOST_ROWS", 2)
    assert len(read(PLAIN)["head"]) == 2
    assert "more than the 2 read" in problems(PLAIN + "1, 2, 3\n4, 5, 6\n7, 8, 9\n")[0]


@pytest.mark.parametrize(
    ("rows", "refused"),
    [
        ("0;74\n1.200;72\n1.500;70\n", True),  # nothing in the file tells whether the point divides thousands
        ("0;74.0\n1.200;72.5\n1.500;70.0\n", False),
        ("0.000;74\n1.200;72\n1.500;70\n", False),
        ("0;74\n0.900;73\n1.200;72\n", False),
    ],
)
def test_a_point_that_may_divide_thousands_is_refused(tmp_path, rows, refused):
    path = tmp_path / "curve.csv"
    path.write_text("flow [m3/h];head [m]\n" + rows, encoding="utf-8")
    if refused:
        with pytest.raises(InputError, match=r"may be 1200 or 1\.200"):
            read_curve_file(path, speed_rpm=1480.0)
    else:
        (curve,) = read_curve_file(path, speed_rpm=1480.0)
        assert curve.head is not None
        assert len(curve.head) == 3


@pytest.mark.parametrize("column", ["head [m]", "npsh3 [m]", "power [kW]"])
def test_a_column_that_is_nowhere_above_zero_is_refused(column):
    (problem,) = problems(f"flow [m3/h], {column}\n0, 0\n100, 0\n200, 0\n")
    assert problem.startswith("curve.csv:2: ")
    assert "is nowhere above zero; leave the column blank where it is not given" in problem
