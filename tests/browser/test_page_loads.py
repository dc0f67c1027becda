"""The page in a real browser, from a file, without a network."""

import shutil
from collections.abc import Iterator
from pathlib import Path
from typing import Any

import pytest

import bidcheck
from bidcheck.quantity import UnitSystem
from bidcheck.report.page import evaluation_page
from tests.build import EXAMPLES

NAMES = ("chromium", "chromium-browser", "google-chrome")
FLAGS = [
    "--no-sandbox",
    "--disable-gpu",
    "--disable-quic",
    "--no-first-run",
    "--disable-background-networking",
    "--disable-component-update",
    "--disable-sync",
]


@pytest.fixture(scope="module")
def browser() -> Iterator[Any]:
    api = pytest.importorskip("playwright.sync_api", reason="playwright is not installed")
    found = next((path for name in NAMES if (path := shutil.which(name))), None)
    if found is None:
        pytest.skip("no Chromium on the path")
    with api.sync_playwright() as playwright:
        browser = playwright.chromium.launch(executable_path=found, args=FLAGS)
        yield browser
        browser.close()


@pytest.fixture(scope="module")
def page_file(tmp_path_factory) -> Path:
    evaluation = bidcheck.evaluate(bidcheck.read_inquiry(EXAMPLES / "cooling_water"))
    path = tmp_path_factory.mktemp("page") / "report.html"
    path.write_text(evaluation_page(evaluation, system=UnitSystem.SI), encoding="utf-8")
    return path


@pytest.fixture
def opened(browser, page_file) -> Iterator[tuple[Any, list[str], list[str]]]:
    page = browser.new_page(viewport={"width": 1200, "height": 900})
    said: list[str] = []
    asked: list[str] = []
    page.on("console", lambda message: said.append(message.text))
    page.on("pageerror", lambda error: said.append(str(error)))
    page.on("request", lambda request: asked.append(request.url))
    page.goto(page_file.as_uri(), wait_until="load")
    yield page, said, asked
    page.close()


def test_opens_without_a_word_and_asks_for_nothing_else(opened, page_file):
    _page, said, asked = opened
    assert said == []
    assert asked == [page_file.as_uri()]


@pytest.mark.parametrize("width", [1200, 768, 420])
def test_the_page_itself_never_scrolls_sideways(opened, width):
    page, _, _ = opened
    page.set_viewport_size({"width": width, "height": 900})
    page.evaluate("document.querySelectorAll('details').forEach(one => one.open = true)")
    assert page.evaluate("document.documentElement.scrollWidth") <= width


def test_the_first_table_with_every_outcome_is_on_the_first_screen(opened):
    page, _, _ = opened
    box = page.locator("table.summary").bounding_box()
    assert box is not None
    assert box["y"] + box["height"] <= 900


def test_figures_are_seen_and_their_labels_stay_inside(opened):
    page, _, _ = opened
    figures = page.locator("figure svg")
    assert figures.count() == 4
    outside = page.evaluate(
        """() => [...document.querySelectorAll('figure svg')].flatMap(svg => {
            const box = svg.getBoundingClientRect();
            return [...svg.querySelectorAll('text')].filter(text => {
                const own = text.getBoundingClientRect();
                return own.left < box.left - 1 || own.right > box.right + 1
                    || own.top < box.top - 1 || own.bottom > box.bottom + 1;
            }).map(text => text.textContent);
        })"""
    )
    assert outside == []


def test_labels_of_a_figure_do_not_lie_on_one_another(opened):
    page, _, _ = opened
    clashes = page.evaluate(
        """() => [...document.querySelectorAll('figure svg')].flatMap(svg => {
            const boxes = [...svg.querySelectorAll('text')]
                .map(text => [text.textContent, text.getBoundingClientRect()]);
            const found = [];
            for (let i = 0; i < boxes.length; i++) for (let j = i + 1; j < boxes.length; j++) {
                const [a, b] = [boxes[i][1], boxes[j][1]];
                const wide = Math.min(a.right, b.right) - Math.max(a.left, b.left);
                const high = Math.min(a.bottom, b.bottom) - Math.max(a.top, b.top);
                if (wide > 2 && high > 4) found.push(boxes[i][0] + ' / ' + boxes[j][0]);
            }
            return found;
        })"""
    )
    assert clashes == []
