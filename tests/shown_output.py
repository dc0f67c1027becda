"""Pages that show a command and what it prints: the output in the page is the program's, never typed by hand."""

import re
import shlex
from collections.abc import Callable

MARK = "<!-- output of the command above -->"
SHOWN = re.compile(
    r"(?P<command>```(?:bash)?\n(?P<line>[^\n]*)\n```\n\n"
    + re.escape(MARK)
    + r"\n)(?:\n```text\n(?P<output>.*?)\n```\n)?",
    re.DOTALL,
)


def arguments(line: str) -> list[str]:
    """Arguments of the last `bidcheck` on a command line.

    Examples
    --------
    >>> arguments(".venv/bin/pip install -q . && .venv/bin/bidcheck evaluate example_bids/cooling_water")
    ['evaluate', 'example_bids/cooling_water']
    """
    words = shlex.split(line)
    last = max(index for index, word in enumerate(words) if word.rpartition("/")[2] == "bidcheck")
    return words[last + 1 :]


def with_output(page: str, run: Callable[[list[str]], str]) -> str:
    """The page with every shown output as `run` prints it now."""

    def shown(match: re.Match[str]) -> str:
        return f"{match['command']}\n```text\n{run(arguments(match['line'])).strip(chr(10))}\n```\n"

    return SHOWN.sub(shown, page)


def command_named(page: str, name: str) -> str:
    """The one line of the code block that follows the mark `<!-- command: NAME -->`."""
    blocks = re.findall(rf"<!-- command: {name} -->\n```bash\n(.*?)\n```\n", page, re.DOTALL)
    if len(blocks) != 1 or "\n" in blocks[0]:
        raise AssertionError(f"one block of one line is wanted for the command {name!r}")
    return str(blocks[0])
