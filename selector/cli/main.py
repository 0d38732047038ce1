"""The program's entry: whatever comes, it ends with a status that says what happened, and without a traceback."""

from __future__ import annotations

import os

from selector.cli import signals

_NEW_OBJECTS = 100_000


def main(arguments: list[str] | None = None) -> int:
    """Run one command and return the exit status; with the arguments of the process, leave the process with it.

    The answer is out and all files are closed by then: to take the interpreter apart object by object would take
    longer than many an answer.
    """
    status = _status(arguments)
    if arguments is None:
        os._exit(status)
    return status


def _status(arguments: list[str] | None) -> int:
    """Run one command and return the exit status.

    Signals are seen to before anything else is imported, streams before anything heavy is.
    """
    status, settle = signals.EXIT_INTERRUPTED, None
    try:
        signals.watch()
        from selector.cli import streams  # noqa: PLC0415 - signals are seen to first

        settle = streams.settle
        streams.prepare()
        status = _run(arguments)
    except KeyboardInterrupt:
        status = signals.EXIT_INTERRUPTED
    except signals.Ended as ended:
        status = ended.status
    signals.ignore()
    return settle(status) if settle is not None else status


def _run(arguments: list[str] | None) -> int:
    """Run one command."""
    import gc  # noqa: PLC0415 - signals are seen to first
    import sys  # noqa: PLC0415 - signals are seen to first

    os.environ.setdefault("OPENBLAS_NUM_THREADS", "1")  # read when numpy starts: more threads only get in the way
    # another package's plugin must not act on how parts and specs are judged, and to look for one takes time
    os.environ.setdefault("PYDANTIC_DISABLE_PLUGINS", "__all__")
    gc.set_threshold(_NEW_OBJECTS)  # what is imported stays: to look through it again and again slows the start
    from selector.cli.run import run  # noqa: PLC0415 - streams are seen to first

    return run(sys.argv[1:] if arguments is None else arguments)
