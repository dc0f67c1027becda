"""Shown output is put in, replaced, and missed where it is wrong."""

import pytest

from tests.shown_output import MARK, command_named, with_output

COMMAND = f"before\n\n```\nbidcheck evaluate 'a b'\n```\n\n{MARK}\n"


def echo(arguments):
    return f"{arguments}\n"


def test_output_is_put_under_the_command():
    page = with_output(COMMAND + "\nafter\n", echo)
    assert page == COMMAND + "\n```text\n['evaluate', 'a b']\n```\n\nafter\n"


def test_output_is_replaced_and_then_stays():
    old = COMMAND + "\n```text\nold\n\nlines\n```\n\nafter\n"
    page = with_output(old, echo)
    assert "old" not in page
    assert page.endswith("\n\nafter\n")
    assert with_output(page, echo) == page


def test_a_command_without_the_mark_is_left_alone():
    page = "```\nbidcheck checks\n```\n\nafter\n"
    assert with_output(page, echo) == page


def test_a_named_command_stands_on_one_line():
    assert command_named("<!-- command: tests -->\n```bash\na && b\n```\n", "tests") == "a && b"
    for page in ("", "<!-- command: tests -->\n```bash\na &&\nb\n```\n"):
        with pytest.raises(AssertionError, match="one line"):
            command_named(page, "tests")
