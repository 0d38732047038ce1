"""The formats that an answer is printed in, in the order in which they are listed."""

from selector.report.format import Format
from selector.report.formats.csv import FORMAT as CSV
from selector.report.formats.json import FORMAT as JSON
from selector.report.formats.markdown import FORMAT as MARKDOWN
from selector.report.formats.table import FORMAT as TABLE

FORMATS: dict[str, Format] = {each.name: each for each in (TABLE, JSON, CSV, MARKDOWN)}
