import tomllib

from bidcheck.read.toml_lines import find_lines, line_of

TEXT = '''\
# [not.a.table]
tag = "a # b" # comment
long = """
[fake]
key = 1
"""
list = [ # opens
  "x]",
  'y[',
]
"quoted key" = 1
a.b = { c = 1, d = "}" }

[duty]
flow = 1
[commercial]
price = 1
[[commercial.adders]]
item = "x"
[[commercial.adders]]
item = "y"
[[curves]]
file = \'\'\'
[x]
\'\'\'
[curves.inner]
z = 1
[[curves]]
file = "b"
'''


def test_lines_of_tables_and_keys():
    tomllib.loads(TEXT)
    lines = find_lines(TEXT)
    assert lines == {
        ("tag",): 2,
        ("long",): 3,
        ("list",): 7,
        ("quoted key",): 11,
        ("a", "b"): 12,
        ("duty",): 14,
        ("duty", "flow"): 15,
        ("commercial",): 16,
        ("commercial", "price"): 17,
        ("commercial", "adders", 0): 18,
        ("commercial", "adders", 0, "item"): 19,
        ("commercial", "adders", 1): 20,
        ("commercial", "adders", 1, "item"): 21,
        ("curves", 0): 22,
        ("curves", 0, "file"): 23,
        ("curves", 0, "inner"): 26,
        ("curves", 0, "inner", "z"): 27,
        ("curves", 1): 28,
        ("curves", 1, "file"): 29,
    }
    assert line_of(lines, ("a", "b", "c")) == 12
    assert line_of(lines, ("nowhere",)) is None


def test_empty_and_unended():
    assert find_lines("") == {}
    assert find_lines("# only a comment") == {}
    assert find_lines("a = 1") == {("a",): 1}
