"""The table format: at most 80 columns, the answer first, nothing that a terminal would obey."""

from __future__ import annotations

from dataclasses import replace
from pathlib import Path

import pytest

from selector.bill import Offer, bill_lines
from selector.candidate import Design
from selector.report import render
from selector.report.answers.answer import Answer
from selector.report.answers.bill import BillShown
from selector.report.answers.check import Checked
from selector.report.answers.query import Shortlist
from selector.report.layout import width_of, wrapped

GOLDEN = Path(__file__).parent / "golden"
HOSTILE = "S\x1b[31m|\u202e\u200b[/b]\x85\x07\u2028=1+1"


def with_code(offer: Offer, code: str) -> Offer:
    """Return an offer whose every part has this code and description."""

    def named(design: Design) -> Design:
        gain = tuple(each.model_copy(update={"part": code}) for each in design.gain or ())
        shunts = tuple(each.model_copy(update={"part": code, "description": code}) for each in design.shunts)
        return replace(design, shunts=shunts, gain=gain, amplifier=design.amplifier.model_copy(update={"part": code}))

    design = named(offer.candidate.design)
    candidate = replace(offer.candidate, design=design)
    return replace(offer, candidate=candidate, bill=bill_lines(design, 1), cautions=(code, f"see {code}"))


def with_codes(answer: Answer, code: str) -> Answer:
    """Return an answer with this code everywhere, also in the title."""
    match answer:
        case Shortlist():
            nearest = answer.nearest and with_code(answer.nearest, code)
            offers = tuple(with_code(offer, code) for offer in answer.offers)
            return replace(answer, offers=offers, nearest=nearest, spec=answer.spec.model_copy(update={"title": code}))
        case BillShown():
            return replace(answer, offer=with_code(answer.offer, code))
        case Checked():
            return replace(answer, offer=answer.offer and with_code(answer.offer, code))
        case _:
            return answer


@pytest.fixture(params=["shortlist", "empty", "checked", "bill"])
def answer(request: pytest.FixtureRequest) -> Answer:
    """Return each of the four answers that show a candidate."""
    found: Answer = request.getfixturevalue(request.param)
    return found


@pytest.mark.parametrize("name", ["shortlist", "empty", "checked", "bill"])
def test_golden_table(request: pytest.FixtureRequest, name: str) -> None:
    """The text is that of the golden file, byte for byte.

    Source: the files, read and found good by eye against the sketches of the screens.
    Tolerance: none.
    """
    text = render(request.getfixturevalue(name), "table")
    assert text.encode() == (GOLDEN / f"{name}.txt").read_bytes()


@pytest.mark.parametrize("code", ["S-1", "L" * 200, "word " * 40, HOSTILE * 8, "\u96fb" * 120, "e\u0301" * 150])
def test_no_line_is_wider_than_80_columns(answer: Answer, code: str) -> None:
    """Whatever a part is called, wide and combining characters included, each line fits, and ends without blanks."""
    lines = render(with_codes(answer, code.strip()), "table").splitlines()
    assert max(map(width_of, lines)) <= 80
    assert [line for line in lines if line != line.rstrip()] == []


def test_a_long_code_stands_there_whole(bill: BillShown) -> None:
    """A code of 200 characters is broken over lines, and no character of it is lost."""
    code = "".join(chr(ord("A") + number % 26) for number in range(200))
    text = render(with_codes(bill, code), "table")
    first = text[text.index("bill for") :]
    start = next(line.index("AB") for line in first.splitlines() if line.startswith("  shunt"))
    column = [line[start:].split(" ")[0] for line in first.splitlines() if len(line) > start]
    assert code in "".join(column)


@pytest.mark.parametrize("form", ["table", "markdown"])
def test_no_character_of_data_is_obeyed(answer: Answer, form: str) -> None:
    r"""ESC, BEL, a C1 control, a bidi override, a zero-width space and a line separator are written as `\x1b`."""
    text = render(with_codes(answer, HOSTILE), form)
    assert [each for each in text if (ord(each) < 32 and each != "\n") or 0x7F <= ord(each) < 0xA0] == []
    assert not {"\u202e", "\u200b", "\u2028"} & set(text)
    bare = text.replace("\\\\", "\\").replace("\n", "").replace(" ", "")
    assert "\\x1b" in bare
    assert "\\u202e\\u200b" in bare


def test_markup_of_data_stays_text(bill: BillShown) -> None:
    """`[/b]` stands in the table as it was entered."""
    assert "see a[/b][red]" in render(with_codes(bill, "a[/b][red]"), "table")


def test_the_same_answer_is_the_same_bytes(answer: Answer) -> None:
    """Two renderings of one answer are equal in every format."""
    for form in ("table", "json", "csv", "markdown"):
        assert render(answer, form) == render(answer, form)


def test_a_text_without_foreign_data_is_ascii(answer: Answer) -> None:
    """All that the program says itself is ASCII."""
    assert render(answer, "table").isascii()


def test_an_error_at_no_current_is_shown_in_ampere(shortlist: Shortlist) -> None:
    """Where the lowest current is 0 there is no share of the reading: errors stand in A."""
    offer = shortlist.offers[0]
    candidate = offer.candidate
    points = (replace(candidate.points[0], current_a=0.0), *candidate.points[1:])
    limiting = replace(candidate.limiting, current_a=0.0)
    at_none = replace(offer, candidate=replace(candidate, points=points, limiting=limiting))
    text = render(replace(shortlist, offers=(at_none,)), "table")
    assert "2.57 uA (4.2 uA)" in text
    assert "where the error comes from at 0 A, in A" in text
    assert "1.26 uA  ####" in text


def test_a_root_of_squares_sums_the_rest_in_squares(shortlist: Shortlist) -> None:
    """In rss the rest, 0.03 and 0.04 uA standard, are 0.05 uA together: 0.0833 % of 60 uA."""
    accuracy = shortlist.spec.accuracy.model_copy(update={"method": "rss"})
    spec = shortlist.spec.model_copy(update={"accuracy": accuracy})
    offer = shortlist.offers[0]
    terms = shortlist.offers[0].candidate.points[0].terms
    extra = replace(terms[5], name="loop gain", standard_a=0.04e-6)
    point = replace(offer.candidate.points[0], terms=(*terms[:5], replace(terms[5], standard_a=0.03e-6), extra))
    candidate = replace(offer.candidate, points=(point, *offer.candidate.points[1:]))
    text = render(replace(shortlist, spec=spec, offers=(replace(offer, candidate=candidate),)), "table")
    assert any(line.split() == ["2", "more", "0.0833"] for line in text.splitlines())


def test_words_are_kept_whole_where_they_fit() -> None:
    """Lines break between words; a word longer than a line is broken inside; empty text is one empty line."""
    assert wrapped("ab cd ef", 5) == ["ab cd", "ef"]
    assert wrapped("abcdefg h", 3) == ["abc", "def", "g h"]
    assert wrapped("", 5) == [""]
