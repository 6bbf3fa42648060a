"""What an input file holds, as frozen records: values with their origin, nothing computed or looked up."""

from __future__ import annotations

from dataclasses import dataclass
from datetime import date
from typing import Literal

from ..quantity import Quantity


@dataclass(frozen=True, kw_only=True)
class Provenance:
    """Where a value comes from and how far it is trusted; empty texts where the file does not say.

    ``status`` is ``verified``, ``maker``, ``preliminary``, ``assumed`` or empty.
    """

    source: str = ""
    place: str = ""
    status: str = ""
    note: str = ""
    confirm: str = ""


@dataclass(frozen=True, kw_only=True)
class Given(Provenance):
    """A value as the file gives it: its address, its text, what was read from it, its origin, its place."""

    key: str
    text: str
    quantity: Quantity
    line: int
    column: int


@dataclass(frozen=True, kw_only=True)
class Extremes:
    """One quantity that varies, by its named extremes."""

    lowest: Given | None = None
    normal: Given | None = None
    highest: Given | None = None
    average: Given | None = None


@dataclass(frozen=True, kw_only=True)
class Source:
    """A document that values come from."""

    id: str
    title: str
    document: str
    edition: str


@dataclass(frozen=True, kw_only=True)
class Revision:
    """One issue of the calculation."""

    revision: str
    date: date
    reason: str


@dataclass(frozen=True, kw_only=True)
class Site:
    """Where the plant stands: ``barometer`` goes before ``elevation`` with its ``weather_allowance``."""

    elevation: Given | None
    weather_allowance: Given | None
    barometer: Extremes | None


@dataclass(frozen=True, kw_only=True)
class Liquid:
    """What is pumped; properties are set where they replace the look-up, always where it is not water."""

    name: str
    temperature: Extremes
    vapour_pressure: Given | None
    density: Given | None
    viscosity: Given | None


@dataclass(frozen=True, kw_only=True)
class Supply:
    """Where the liquid comes from; a gas-blanketed vessel has a ``pressure``, a main has no ``level``."""

    name: str
    kind: Literal["open", "gas_blanketed", "main"]
    level: Extremes | None
    pressure: Extremes | None


@dataclass(frozen=True, kw_only=True)
class Pipe:
    """A bore: either a nominal ``size`` with its ``schedule``, or ``bore``; absent texts are empty."""

    size: str
    schedule: str
    bore: Given | None
    provenance: Provenance


@dataclass(frozen=True, kw_only=True)
class Element:
    """One thing the liquid passes.  Which fields are set follows from ``kind``; absent texts are empty.

    entrance: ``shape`` or ``K`` · pipe: ``length`` · elbow: ``angle``, ``radius``, ``count`` ·
    valve: ``type``, ``count`` · tee: ``flow``, ``count`` · fitting: ``name``, ``K``, ``count`` ·
    strainer: ``name``, ``clean``, ``fouled``, ``at_flow``.
    """

    id: str
    kind: Literal["entrance", "pipe", "elbow", "valve", "tee", "fitting", "strainer"]
    name: str
    count: int
    length: Given | None
    shape: str
    angle: int
    radius: str
    type: str
    flow: str
    K: Given | None
    clean: Given | None
    fouled: Given | None
    at_flow: Given | None
    provenance: Provenance
    key: str
    line: int
    column: int


@dataclass(frozen=True, kw_only=True)
class Section:
    """A stretch of line of one bore; ``roughness`` goes before ``material``, which may then be empty."""

    id: str
    name: str
    pipe: Pipe
    material: str
    roughness: Given | None
    elements: tuple[Element, ...]
    provenance: Provenance
    key: str
    line: int
    column: int


@dataclass(frozen=True, kw_only=True)
class Line:
    """The suction line, from the supply to the pump's suction nozzle."""

    fitting_set: str
    friction_contingency: Given | None
    sections: tuple[Section, ...]
    provenance: Provenance


@dataclass(frozen=True, kw_only=True)
class NpshRequired:
    """The maker's figure and what it holds for."""

    value: Given
    at_flow: Given
    speed: Given | None
    impeller: Given | None
    curve: str
    basis: str
    certified: str
    datum: str
    provenance: Provenance


@dataclass(frozen=True, kw_only=True)
class Pump:
    """One pump; ``flow`` always has ``highest``, ``datum`` is its NPSH datum in words."""

    name: str
    flow: Extremes
    datum_elevation: Given
    datum: str
    npsh_required: NpshRequired


@dataclass(frozen=True, kw_only=True)
class Intake:
    """The mouth of the suction line in the free surface; ``elevation`` is that of ``reference``."""

    inlet_diameter: Given
    reference: Literal["bell_lip", "inlet_centreline"]
    elevation: Given


@dataclass(frozen=True, kw_only=True)
class Submergence:
    """How the least submergence is found."""

    method: str
    provenance: Provenance


@dataclass(frozen=True, kw_only=True)
class Criteria:
    """What must be met: ``ratio``, ``difference`` or both; ``submergence`` where a method is named."""

    ratio: Given | None
    difference: Given | None
    submergence: Submergence | None


@dataclass(frozen=True, kw_only=True)
class Gauge:
    """The suction gauge; ``tap_elevation`` is always set for a dry ``leg``."""

    pressure: Given
    elevation: Given
    leg: Literal["filled", "dry"]
    tap: Pipe
    tap_elevation: Given | None


@dataclass(frozen=True, kw_only=True)
class Reading:
    """One test; ``strainers`` is ``clean``, ``fouled`` or empty where the line has no strainer."""

    name: str
    date: date
    flow: Given
    barometer: Given
    temperature: Given
    level: Given | None
    surface_pressure: Given | None
    gauge: Gauge
    strainers: str
    provenance: Provenance
    key: str
    line: int
    column: int


@dataclass(frozen=True, kw_only=True)
class Calculation:
    """A whole input file.

    ``line`` with ``supply.level`` gives the design route, ``readings`` the measured one, and one is there.
    ``path`` is the file's name without its folder, ``named`` the path as it was asked for (faults say it), both with
    what cannot be printed written out; ``raw`` its bytes, ``sha256`` their digest in hexadecimal.
    """

    number: str
    title: str
    revision: str
    date: date
    owner: str
    project: str
    units: Literal["SI", "US"]
    paper: Literal["A4", "Letter"]
    status: str
    purpose: str
    datum: str
    revisions: tuple[Revision, ...]
    sources: tuple[Source, ...]
    site: Site
    liquid: Liquid
    supply: Supply
    line: Line | None
    pump: Pump
    intake: Intake | None
    criteria: Criteria
    readings: tuple[Reading, ...]
    path: str
    named: str
    raw: bytes
    sha256: str
