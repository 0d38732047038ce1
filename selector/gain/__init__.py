"""The gain laws an amplifier may follow, by the name a part states."""

from selector.gain.current_output import CurrentOutput
from selector.gain.difference import Difference
from selector.gain.fixed import Fixed
from selector.gain.law import Law, LawFigures, Stage
from selector.gain.non_inverting import NonInverting
from selector.gain.one_resistor import OneResistor
from selector.gain.two_resistor import TwoResistor

LAWS: dict[str, Law] = {
    law.name: law for law in (Fixed(), NonInverting(), OneResistor(), TwoResistor(), CurrentOutput(), Difference())
}

__all__ = ["LAWS", "Law", "LawFigures", "Stage"]
