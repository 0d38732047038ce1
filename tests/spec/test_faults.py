"""Bad specs and the exact sentence each of them is answered with."""

from __future__ import annotations

from pathlib import Path

import pytest

from selector.errors import InputRefused
from selector.parts import KINDS
from selector.spec import load_spec

GOOD = """\
title = "Orchard frost alarm"
[current]
min = "60 uA"
max = "60 mA"
[accuracy]
reading = "2 %"
floor = "3 uA"
[limits]
burden = "100 mV"
power = "20 mW"
[supply]
voltage = "3.3 V"
[sense]
[output]
[converter]
bits = 12
reference = "2.5 V"
[ambient]
min = "-20 degC"
max = "50 degC"
[signal]
bandwidth = "200 Hz"
[ranges]
[filter]
[parts]
[rank]
"""
BANDS = 'reading = "2 %"\nfloor = "3 uA"'

# What stands in the good spec, what stands there instead, and what is said.
BAD: tuple[tuple[str, str, str], ...] = (
%s)


def faults(folder: Path, text: str, overrides: dict[str, str] | None = None) -> list[str]:
    """Return the messages with which a spec is refused."""
    path = folder / "frost.toml"
    path.write_bytes(text.encode("utf-8", "surrogatepass"))
    with pytest.raises(InputRefused) as refused:
        load_spec(path, overrides or {}, kinds=KINDS)
    return [str(fault) for fault in refused.value.faults]
