"""The catalogue of parts, kept in one SQLite file.

What changes and searches answer with stands in `bulk`, `find`, `info` and `merge`, which other readers do without.
"""

from selector.catalogue.catalogue import Catalogue, in_memory, open_catalogue
from selector.catalogue.place import default_path

__all__ = ["Catalogue", "default_path", "in_memory", "open_catalogue"]
