"""Each answer told as JSON, as a document and as records: one file per answer, by the name of its module."""

from collections.abc import Mapping
from types import MappingProxyType

from selector.report import answers
from selector.report.answers import Answer

VIEWS: Mapping[type[Answer], str] = MappingProxyType(
    {
        answers.Shortlist: "query",
        answers.Checked: "check",
        answers.BillShown: "bill",
        answers.PartsListed: "parts",
        answers.PartsFound: "found",
        answers.PartsChanged: "changed",
        answers.Loaded: "loaded",
        answers.SeriesShown: "series",
        answers.SpecShown: "spec",
        answers.CatalogueShown: "catalogue",
    }
)
