"""What all tests share: golden files and the flag that rewrites them."""

from collections.abc import Callable

import pytest

from tests.golden_files import FLAG, ROOT, hold_against


def pytest_addoption(parser: pytest.Parser) -> None:
    parser.addoption(
        FLAG,
        action="store_true",
        help="rewrite tests/golden, the generated pages of docs and the output in README; review by diff",
    )


@pytest.fixture
def update_golden(request: pytest.FixtureRequest) -> bool:
    """Whether golden files are to be rewritten."""
    return bool(request.config.getoption(FLAG))


@pytest.fixture
def golden(update_golden: bool) -> Callable[[str, str], None]:
    """Compare a text with the file of a name: docs/... in the repository, anything else in tests/golden."""

    def compare(name: str, text: str) -> None:
        path = ROOT / name if name.startswith("docs/") else ROOT / "tests" / "golden" / name
        hold_against(path, text, update=update_golden)

    return compare
