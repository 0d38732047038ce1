"""The catalogue of parts, kept in one SQLite file."""

from selector.catalogue.catalogue import Catalogue, in_memory, open_catalogue
from selector.catalogue.find import Found
from selector.catalogue.info import Info, KindCount
from selector.catalogue.merge import Change, Conflict, Merge
from selector.catalogue.place import default_path

__all__ = [
    "Catalogue",
    "Change",
    "Conflict",
    "Found",
    "Info",
    "KindCount",
    "Merge",
    "default_path",
    "in_memory",
    "open_catalogue",
]
