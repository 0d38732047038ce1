"""What people and programs see of an answer."""

from selector.report.clean import clean, encodable
from selector.report.design import design_toml
from selector.report.formats import FORMATS
from selector.report.render import render

__all__ = ["FORMATS", "clean", "design_toml", "encodable", "render"]
