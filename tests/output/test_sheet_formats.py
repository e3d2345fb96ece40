"""The sheet on paper and screen: one page, nothing cut in silence, nothing from outside that acts."""

import hashlib
import re
import subprocess
import sys
from dataclasses import replace
from html.parser import HTMLParser
from pathlib import Path

import pytest
from markdown_it import MarkdownIt
from sheet_making import DECK, DETAILS, REMNANT, SIXTY, asked, inside, pages, sheet, shown

from catalog.errors import InputError
from catalog.report import pdf_letters
from catalog.report.outside_text import tame
from catalog.report.sheet import DEMO, Sheet, build_sheet
from catalog.report.sheet_html import to_html
from catalog.report.sheet_markdown import to_markdown
from catalog.report.sheet_pdf import to_pdf
from catalog.search.candidate import Finding, Fit, StockLine

PAPERS = ("A4", "Letter")
SIZES = {"A4": (595.28, 841.89), "Letter": (612.0, 792.0)}
"""Points: 210 × 297 mm (ISO 216) and 8.5 × 11 in (ANSI Y14.1)."""
NASTY = (
    "<script>alert(1)</script> **b** [a](http://x.y) | `c` https://x.y <b onclick=1> \x1b[31m\u202egnp.exe &lt; {{7}}"
)


def crowded(findings: int = 15, name: str = "W" * 200) -> Sheet:
    """The longest names, many findings, many lots."""
    answer, candidate = asked()
    found = tuple(
        Finding(
            f"rule {i}", (True, False, None)[i % 3], f"Finding {i}: {'the opening has to be measured ' * 4}", "a rule"
        )
        for i in range(findings)
    )
    lots = tuple(StockLine(replace(REMNANT, id=f"L-{i}", location=name), Fit(True, "serves")) for i in range(12))
    cloth = replace(SIXTY, name=name, declared=name, source=name, grade=name, standard=name)
    full = replace(candidate, cloth=cloth, findings=found, stock=lots)
    details = replace(DETAILS, number=name, reference=name, use=name, requested_by=name, quantity=name)
    return build_sheet(replace(answer, cautions=("Mind the opening. " * 10,) * 4), full, details)


def nasty() -> Sheet:
    """A sheet whose every outside text tries something."""
    answer, candidate = asked()
    lots = (StockLine(replace(REMNANT, id=NASTY, location=NASTY, heat=NASTY, form=NASTY), Fit(True, NASTY)),)
    cloth = replace(SIXTY, name=NASTY, declared=NASTY, source=NASTY, grade=NASTY)
    found = replace(candidate, cloth=cloth, stock=lots, findings=(Finding("x", True, NASTY, NASTY),), reason=NASTY)
    details = replace(DETAILS, number=NASTY, reference=NASTY, use=NASTY, requested_by=NASTY, quantity=NASTY)
    asked_for = replace(answer, request=replace(answer.request, text=NASTY), cautions=(NASTY,))
    return build_sheet(asked_for, found, details)


@pytest.mark.parametrize("paper", PAPERS)
def test_a_sheet_is_one_page_of_its_paper(paper: str) -> None:
    pdf = to_pdf(sheet(), paper)
    assert pages(pdf) == 1
    box = re.search(rb"/MediaBox \[ 0 0 ([\d.]+) ([\d.]+) \]", pdf)
    assert box is not None
    assert [float(side) for side in box.groups()] == pytest.approx(SIZES[paper], abs=0.1)


@pytest.mark.parametrize("paper", PAPERS)
@pytest.mark.parametrize("findings", [0, 15, 80])
def test_nothing_falls_off_the_page_with_the_longest_names(paper: str, findings: int) -> None:
    pdf = to_pdf(crowded(findings), paper)
    commands = inside(pdf)
    left, top = (float(v) for v in re.findall(r"1 0 0 1 (\S+) (\S+) cm", commands)[1])
    places = [(left + float(x), top + float(y)) for x, y in re.findall(r"BT 1 0 0 1 (\S+) (\S+) Tm", commands)]
    width, height = SIZES[paper]
    assert pages(pdf) == 1
    assert len(places) > 50
    assert all(0 < x < width and 0 < y < height for x, y in places)


@pytest.mark.parametrize("paper", PAPERS)
def test_what_is_left_out_is_counted(paper: str) -> None:
    said = shown(to_pdf(crowded(80), paper))
    printed = len(re.findall(r"(?:NOT MET|OPEN|MET): Finding", said))
    left = re.search(r"(\d+) more findings \(.*\): see the JSON", said)
    assert left is not None
    assert printed + int(left[1]) == 80
    assert printed > 0
    lots = re.search(r"(\d+) more lots: see the JSON", said)
    assert lots is not None
    assert len(re.findall(r"^L-\d+$", said, re.MULTILINE)) + int(lots[1]) == 12


def test_a_shortened_name_says_by_how_much() -> None:
    said = shown(to_pdf(crowded()))
    assert re.search(r"\[\+\d+\]", said)
    assert "so many more characters" in said


def test_an_ordinary_sheet_leaves_nothing_out() -> None:
    said = shown(to_pdf(sheet()))
    assert "see the JSON" not in said
    assert "[+" not in said


def test_a_sheet_says_the_same_in_all_three_formats() -> None:
    made = sheet(replace(SIXTY, demo=True))
    for text in (to_markdown(made), to_html(made), shown(to_pdf(made)).replace("\n", " ")):
        flat = text.replace("\\", "")
        for words in (DEMO, "0.2582 mm", "hurts retain", "R-117", "H47110", "S-0001", "2027-03-31", "approves nothing"):
            assert words in flat, words
        assert made.fingerprint[:8] in flat


def test_no_other_paper_is_known() -> None:
    with pytest.raises(InputError, match="A4 or Letter"):
        to_pdf(sheet(), "B5")


def test_the_same_sheet_is_the_same_file_wherever_it_is_made() -> None:
    code = (
        "import hashlib; from sheet_making import sheet; from catalog.report.sheet_pdf import to_pdf;"
        "print(hashlib.sha256(to_pdf(sheet())).hexdigest())"
    )
    folder = Path(__file__).parent
    done = subprocess.run(
        [sys.executable, "-c", code],
        cwd=folder,
        capture_output=True,
        text=True,
        check=True,
        env={"PYTHONHASHSEED": "7"},
    )
    assert done.stdout.strip() == hashlib.sha256(to_pdf(sheet())).hexdigest()


class Tags(HTMLParser):
    """Collects what a browser would act on."""

    def __init__(self) -> None:
        super().__init__()
        self.names: set[str] = set()
        self.attributes: set[str] = set()

    def handle_starttag(self, tag: str, attrs: list[tuple[str, str | None]]) -> None:
        self.names.add(tag)
        self.attributes |= {name for name, _ in attrs}


def test_text_from_outside_stays_text_in_html() -> None:
    tags = Tags()
    tags.feed(to_html(nasty()))
    assert not tags.names & {"script", "b", "a", "img", "iframe", "object", "link"}
    assert not {name for name in tags.attributes if name.startswith("on") or name in ("href", "src")}
    assert "&lt;script&gt;" in to_html(nasty())


def test_text_from_outside_stays_text_in_markdown() -> None:
    made = nasty()
    rendered = MarkdownIt("gfm-like", {"linkify": False, "html": True}).render(to_markdown(made))
    tags = Tags()
    tags.feed(rendered)
    assert not tags.names & {"script", "b", "a", "img", "code-block"}
    assert "<strong>b</strong>" not in rendered
    assert "&lt;script&gt;alert(1)&lt;/script&gt; **b** [a](http://x.y) | `c` https://x.y" in rendered
    assert rendered.count("<table>") == 4


def test_an_address_in_a_name_becomes_no_link_of_itself() -> None:
    # GitHub links a bare 'https://' and 'www.'; with a backslash between it doesn't
    assert "https://" not in to_markdown(nasty())
    assert "www." not in to_markdown(sheet(use="see www.example.org"))


@pytest.mark.parametrize("write", [to_markdown, to_html, lambda made: shown(to_pdf(made))])
def test_no_control_character_and_no_mark_of_direction_comes_through(write: object) -> None:
    text = write(nasty())  # type: ignore[operator]
    assert not set(text) & {"\x1b", "\u202e", "\u200b", "\x07", "\x00"}
    assert "U+202E" in text.replace("\\", "")


def test_a_name_of_lone_surrogates_and_nothing_is_no_reason_to_fail() -> None:
    made = sheet(replace(SIXTY, name="\ud800\ud801", declared=""))
    for text in (to_markdown(made), to_html(made)):
        text.encode("utf-8")
    assert pages(to_pdf(made)) == 1


def test_cyrillic_and_chinese_names_are_kept_on_screen_and_spelled_on_paper() -> None:
    made = sheet(replace(SIXTY, name="Марлхольм 網布"))
    assert "Марлхольм 網布" in to_html(made)
    assert "Марлхольм 網布" in to_markdown(made)
    said = shown(to_pdf(made))
    # customary transliteration: р r, х kh, л l; the Chinese signs by their code points
    assert "Marlkhol" in said
    assert "[U+7DB2 U+5E03]" in said
    assert "transliterated" in said
    assert "transliterated" not in shown(to_pdf(sheet()))


@pytest.mark.parametrize("sign", "µ×±²³Ø≤≥−–…°·½¼éßñÅœŁš“”‘’•€√≈∞")
def test_the_signs_of_the_trade_have_a_glyph_of_their_own(sign: str) -> None:
    assert pdf_letters.printable(sign) == sign


@pytest.mark.parametrize(
    ("written", "printed"), [("ő", "o"), ("μm", "µm"), ("16″", '16"'), ("１２", "12"), ("→", "->"), ("щ", "shch")]
)
def test_a_letter_without_a_glyph_has_a_plain_twin(written: str, printed: str) -> None:
    assert pdf_letters.printable(written) == printed


def test_a_long_text_is_cut_with_its_count_and_one_and_a_half_stays_one_and_a_half() -> None:
    assert tame("x" * 250).endswith("… [50 more characters]")
    assert tame("1½ in") == "1½ in"
    assert tame("a\n b\tc") == "a b c"


def test_html_fetches_nothing() -> None:
    text = to_html(sheet(SIXTY, DECK))
    assert "default-src 'none'" in text
    assert not re.search(r"(?:src|href)=|url\(|@import", text)
