"""The package as a PDF/A-3u file: templates filled, set in the bundled fonts only, record and input attached.

The same record and attachments give the same bytes: dates come from the record, the identifier from its fingerprint.
"""

from __future__ import annotations

import gc
import logging
import os
import warnings
from collections.abc import Iterator, Mapping, Sequence
from contextlib import contextmanager
from datetime import UTC, datetime
from html import unescape
from html.parser import HTMLParser
from typing import Any

from ..resources import find_resource
from . import metrics
from .view import context

#: Which library cuts the fonts down is the machine's matter, not a defect of the page.
_HARMLESS = "Using fontTools instead of HarfBuzz-Subset"
Attached = tuple[str, bytes, str, str]  # name, content, description, relationship (Source, Data)


class PageError(RuntimeError):
    """The page could not be set as it must be: a defect of the page or of the installation, not of the input."""


def render(record: Mapping[str, Any], attachments: Sequence[Attached]) -> bytes:
    """The package of ``record`` with ``attachments`` embedded.

    Raises :class:`PageError` where the engine warns, a character is not in the bundled fonts or another font got in.
    """
    with warnings.catch_warnings():
        warnings.filterwarnings("ignore", "HarfBuzz-Subset", DeprecationWarning)  # as _HARMLESS
        import weasyprint  # half a second to load: only where a page is set
    from weasyprint.text.fonts import FontConfiguration
    from weasyprint.urls import URLFetcher

    html = fill(record)
    _only_known_characters(html)
    issued = datetime.fromisoformat(record["calculation"]["date"]).replace(tzinfo=UTC)
    files = [
        weasyprint.Attachment(
            string=content,
            name=name,
            description=description,
            created=issued,
            modified=issued,
            relationship=relationship,
        )
        for name, content, description, relationship in attachments
    ]
    base = find_resource("templates", "package.html").as_uri()
    fetcher = URLFetcher(allowed_protocols=("file", "data"), fail_on_errors=True)
    with _strict(), _uncollected(), _dated(issued):
        written = weasyprint.HTML(string=html, base_url=base, url_fetcher=fetcher).write_pdf(
            finisher=_finish, font_config=FontConfiguration(), attachments=files, pdf_variant="pdf/a-3u",
            pdf_identifier=bytes.fromhex(record["fingerprint"])[:16],
        )  # fmt: skip
    return bytes(written)


def fill(record: Mapping[str, Any]) -> str:
    """The package as HTML."""
    from jinja2 import Environment, FileSystemLoader, StrictUndefined

    folder = find_resource("templates", "package.html").parent
    environment = Environment(
        loader=FileSystemLoader(folder), autoescape=True, undefined=StrictUndefined, trim_blocks=True
    )
    return environment.get_template("package.html").render(context(record), faces=metrics.FACES)


class _Text(HTMLParser):
    """Collects the characters that will be printed."""

    def __init__(self) -> None:
        super().__init__(convert_charrefs=True)
        self.characters: set[str] = set()
        self._hidden = ""

    def handle_starttag(self, tag: str, attrs: list[tuple[str, str | None]]) -> None:
        self._hidden = tag if tag in ("style", "title") else ""

    def handle_endtag(self, tag: str) -> None:
        self._hidden = ""

    def handle_data(self, data: str) -> None:
        if not self._hidden:
            self.characters |= set(unescape(data))


def _only_known_characters(html: str) -> None:
    parser = _Text()
    parser.feed(html)
    known = frozenset.union(*(metrics.covered(face) for face in metrics.FACES))
    for character in sorted(parser.characters):
        if ord(character) not in known and not character.isspace():
            raise PageError(f"the page's fonts have no U+{ord(character):04X} {character!r}")


@contextmanager
def _strict() -> Iterator[None]:
    """Every warning of the engine is a defect of the page."""
    heard: list[str] = []

    class Listener(logging.Handler):
        def emit(self, record: logging.LogRecord) -> None:
            if not record.getMessage().startswith(_HARMLESS):
                heard.append(record.getMessage())

    logger, listener = logging.getLogger("weasyprint"), Listener(logging.WARNING)
    propagate = logger.propagate
    logger.addHandler(listener)
    logger.propagate = False
    try:
        yield
    finally:
        logger.removeHandler(listener)
        logger.propagate = propagate
    if heard:
        raise PageError("the page could not be set: " + "; ".join(heard[:5]))


@contextmanager
def _uncollected() -> Iterator[None]:
    """No garbage collection while a document is laid out: it only costs time."""
    enabled = gc.isenabled()
    gc.disable()
    try:
        yield
    finally:
        if enabled:
            gc.enable()


@contextmanager
def _dated(issued: datetime) -> Iterator[None]:
    """fontTools writes the time of day into the fonts it cuts down, unless this variable says otherwise."""
    before = os.environ.get("SOURCE_DATE_EPOCH")
    os.environ["SOURCE_DATE_EPOCH"] = str(int(issued.timestamp()))
    try:
        yield
    finally:
        del os.environ["SOURCE_DATE_EPOCH"]
        if before is not None:
            os.environ["SOURCE_DATE_EPOCH"] = before


def _finish(document: Any, pdf: Any) -> None:
    """Refuse foreign fonts; list each attachment once."""
    bundled = {
        _plain(f"{face.family} {'' if face.weight == 400 else 'SemiBold'} {'' if face.style == 'normal' else 'Italic'}")
        for face in metrics.FACES
    }
    for item in pdf.objects:
        if isinstance(item, dict) and item.get("Type") == "/Font" and "BaseFont" in item:
            name = str(item["BaseFont"]).partition("+")[2]
            if _plain(name).removesuffix("regular") not in bundled:
                raise PageError(f"a font that is not bundled was used: {name}")
    if "AF" in pdf.catalog:  # the engine enters every attachment twice
        pdf.catalog["AF"][:] = dict.fromkeys(pdf.catalog["AF"])


def _plain(name: str) -> str:
    return "".join(c for c in name.lower() if c.isalnum())
