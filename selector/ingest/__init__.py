"""Stock files read into parts, and parts written as stock files."""

from selector.ingest.refused import CellFault, RefusedRow, RefusedRows
from selector.ingest.rejects import rejects_text
from selector.ingest.result import ColumnRead, MissingFields, Read, StockFile, refusing_shared
from selector.ingest.stock import read_stock
from selector.ingest.template import template
from selector.ingest.writing import stock_csv

__all__ = [
    "CellFault",
    "ColumnRead",
    "MissingFields",
    "Read",
    "RefusedRow",
    "RefusedRows",
    "StockFile",
    "read_stock",
    "refusing_shared",
    "rejects_text",
    "stock_csv",
    "template",
]
