"""The main job on the scenario that comes with the program."""

from __future__ import annotations

import shutil
from pathlib import Path

from selector.app.load import stock_of_files
from selector.app.naming import shown_path
from selector.app.output import cannot_write
from selector.app.query import Progress, shortlist
from selector.app.specs import Asked, read_spec
from selector.catalogue import in_memory, open_catalogue
from selector.errors import Fault, Unusable, UsageRefused
from selector.report.answers.query import Shortlist

SPEC = "frost_alarm.toml"
CATALOGUE = "catalogue.db"
_PACKAGE = Path(__file__).resolve().parents[1]


def data_folder() -> Path:
    """Return where the scenario lies: in the installed package, else in the checkout.

    Raises
    ------
    Unusable
        It was taken away.
    """
    for folder in (_PACKAGE / "data", _PACKAGE.parent / "data"):
        if (folder / SPEC).is_file():
            return folder
    raise Unusable(Fault(shown_path(_PACKAGE / "data"), "the scenario is not there", "install selector again"))


def demo(keep: Path | None = None, progress: Progress | None = None) -> Shortlist:
    """Return the short list of the bundled spec over the bundled parts.

    Parameters
    ----------
    keep : Path or None
        A new or empty folder that then holds the specs and the catalogue; None leaves nothing behind.
    progress
        Called with the pairs done and their number.

    Raises
    ------
    UsageRefused
        The folder has something in it already.
    Unusable
        The folder cannot be made or written.
    """
    data = data_folder()
    files = sorted((data / "parts").glob("*.csv"))
    if keep is None:
        catalogue = in_memory()
    else:
        _fill_folder(keep, data)
        catalogue = open_catalogue(keep / CATALOGUE, write=True)
    with catalogue:
        stock_of_files(files, catalogue)
        return shortlist(read_spec(Asked(data / SPEC)), catalogue, progress=progress)


def _fill_folder(folder: Path, data: Path) -> None:
    """Put the specs into a folder that is new or empty."""
    where = shown_path(folder)
    try:
        folder.mkdir(parents=True, exist_ok=True)
        if any(folder.iterdir()):
            raise UsageRefused(Fault(where, "has files in it already", "name a new or an empty folder"))
        for spec in sorted(data.glob("*.toml")):
            shutil.copyfile(spec, folder / spec.name)
    except (FileExistsError, NotADirectoryError) as error:
        raise UsageRefused(Fault(where, "is no folder", "name a new or an empty folder")) from error
    except OSError as error:
        raise cannot_write(folder, error) from error
