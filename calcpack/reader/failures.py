"""Why something could not be read or computed; the message of each says what was found."""

from __future__ import annotations


class NotAPackage(ValueError):
    """The file cannot be opened as a PDF, or it is none of our packages."""


class Unread(ValueError):
    """Print that is outside the contract of the page."""


class Undefined(ValueError):
    """A form without a finite value."""
