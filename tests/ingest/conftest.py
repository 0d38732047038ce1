"""Stock files made on the spot."""

from __future__ import annotations

from collections.abc import Callable, Mapping
from pathlib import Path

import pytest

from selector.ingest import StockFile, read_stock

Load = Callable[..., StockFile]


@pytest.fixture
def load(tmp_path: Path) -> Load:
    """Return a reader of a text or bytes as the stock file `stock.csv`."""

    def read(
        content: str | bytes, *, kind: str | None = None, headings: Mapping[str, str] | None = None, who: str = ""
    ) -> StockFile:
        path = tmp_path / "stock.csv"
        path.write_bytes(content if isinstance(content, bytes) else content.encode("utf-8"))
        return read_stock(path, kind=kind, headings=headings, who=who)

    return read
