"""What an input file holds, as frozen records: values with their origin, nothing computed or looked up."""

from __future__ import annotations

from dataclasses import dataclass
from datetime import date
from typing import Literal

from .given import Extremes as Extremes
from .given import Given as Given
from .given import Level as Level
from .given import Provenance as Provenance
from .given import Revision as Revision
from .given import Source as Source


@dataclass(frozen=True, kw_only=True)
class Site:
    """Where the plant stands: ``barometer`` goes before ``elevation`` with its ``weather_allowance``."""

    elevation: Given | None
    weather_allowance: Given | None
    barometer: Extremes | None


@dataclass(frozen=True, kw_only=True)
class PropertyRow:
    """A row of a cited table: properties at one temperature; absent ones are ``None`` in every row alike."""

    temperature: Given
    density: Given | None
    viscosity: Given | None
    vapour_pressure: Given | None


@dataclass(frozen=True, kw_only=True)
class Liquid:
    """What is pumped.

    A single property goes before ``table``, the table before the look-up of ``name``.  ``mass_fraction`` is that of the
    glycol or salt in water, ``salinity`` that of sea water.  ``vapour_pressure_kind`` is ``saturation``, ``effective``
    (dissolved gas) or empty; ``vapour_pressure_of``, for a mixture with water, ``raoult``, ``water`` or empty.
    """

    name: str
    temperature: Extremes
    mass_fraction: Given | None
    salinity: Given | None
    vapour_pressure: Given | None
    vapour_pressure_kind: str
    vapour_pressure_of: str
    density: Given | None
    viscosity: Given | None
    table: tuple[PropertyRow, ...]


@dataclass(frozen=True, kw_only=True)
class Supply:
    """Where the liquid comes from.

    open, gas_blanketed, saturated: a surface, with ``level``; gas_blanketed has a ``pressure``, saturated may state one.
    loop, main: no surface; ``pressure`` holds at the centreline of a pipe at ``elevation``, ``velocity_head`` says whether
    the velocity head there (in the bore of the first section) counts: ``counted`` or ``left_out``.  Of a main without a
    line all three are absent.  ``point`` says in words where the pressure of a loop is held, ``high_point`` is the
    elevation of the highest point of the loop.
    """

    name: str
    kind: Literal["open", "gas_blanketed", "saturated", "loop", "main"]
    level: Level | None
    pressure: Extremes | None
    elevation: Given | None
    velocity_head: str
    point: str
    high_point: Given | None
    key: str
    line: int
    column: int


@dataclass(frozen=True, kw_only=True)
class Pipe:
    """A bore: either a nominal ``size`` with its ``schedule``, or ``bore``; absent texts are empty."""

    size: str
    schedule: str
    bore: Given | None
    provenance: Provenance


@dataclass(frozen=True, kw_only=True)
class LossPoint:
    """A point of a maker's curve: what is lost, as head or pressure difference, at a flow."""

    flow: Given
    loss: Given


@dataclass(frozen=True, kw_only=True)
class Element:
    """One thing the liquid passes.  Which fields are set follows from ``kind``; absent texts are empty.

    entrance: ``shape`` · pipe: ``length`` · elbow: ``angle``, ``radius`` · valve: ``type`` · tee: ``flow`` ·
    reducer: ``type`` (concentric, eccentric), ``to`` or ``from_pipe`` (the bore at its other end), ``length`` (of the
    taper; absent: a sudden change), ``flat_side`` of an eccentric one · strainer: ``clean``, ``fouled`` (may be absent),
    ``at_flow`` · equipment, connector: ``loss`` with ``at_flow``, or ``curve`` (equipment only) · fitting: ``name``.
    Every kind but pipe and strainer may state its loss by ``K``, ``L_over_D``, ``Cv`` or ``Kv`` instead; ``set`` names the
    published set where it is not the line's.  ``elevation`` is that of the centreline at the element's end, or its highest
    point; ``drawing`` where it is drawn.
    """

    id: str
    kind: Literal[
        "entrance", "pipe", "elbow", "valve", "tee", "reducer", "strainer", "connector", "equipment", "fitting"
    ]
    name: str
    count: int
    length: Given | None
    shape: str
    angle: int
    radius: str
    type: str
    flow: str
    flat_side: str
    to: Pipe | None
    from_pipe: Pipe | None
    K: Given | None
    L_over_D: Given | None
    Cv: Given | None
    Kv: Given | None
    set: str
    clean: Given | None
    fouled: Given | None
    loss: Given | None
    at_flow: Given | None
    curve: tuple[LossPoint, ...]
    elevation: Given | None
    drawing: str
    provenance: Provenance
    key: str
    line: int
    column: int


@dataclass(frozen=True, kw_only=True)
class Section:
    """A stretch of line of one bore.

    ``roughness`` goes before ``material`` with its ``condition`` (``new``, ``aged`` or empty); ``coefficient_C`` is that of
    Hazen and Williams; ``axis_length`` counts fittings and valves in; ``pumps`` how many pumps it serves, of which
    those running send their flow through it.
    """

    id: str
    name: str
    pipe: Pipe
    material: str
    condition: str
    roughness: Given | None
    coefficient_C: Given | None
    axis_length: Given | None
    pumps: int
    elements: tuple[Element, ...]
    provenance: Provenance
    key: str
    line: int
    column: int


@dataclass(frozen=True, kw_only=True)
class Line:
    """The suction line, from the supply to the pump's suction nozzle.

    ``loss_method`` is ``darcy_weisbach`` or ``hazen_williams``; ``mixed_sets`` is ``intended`` where elements of other
    sets than ``fitting_set`` are meant, else empty.
    """

    loss_method: str
    fitting_set: str
    mixed_sets: str
    friction_contingency: Given | None
    withheld_head: Given | None
    sections: tuple[Section, ...]
    provenance: Provenance


@dataclass(frozen=True, kw_only=True)
class CurvePoint:
    """A point of the NPSH curve."""

    flow: Given
    npsh: Given


@dataclass(frozen=True, kw_only=True)
class NpshRequired:
    """The maker's figure and what it holds for: ``points`` of a curve in rising flow, or ``value`` at ``at_flow``.

    ``interpolation`` is ``linear`` or ``smooth``; ``speed`` is that of the curve, ``speed_exponent`` the power of the speed
    ratio; ``datum_elevation`` is set where the curve counts from another elevation than the pump's datum.
    """

    value: Given | None
    at_flow: Given | None
    points: tuple[CurvePoint, ...]
    interpolation: str
    speed: Given | None
    speed_exponent: Given | None
    impeller: Given | None
    curve: str
    basis: str
    certified: str
    datum: str
    datum_elevation: Given | None
    provenance: Provenance
    key: str
    line: int
    column: int


@dataclass(frozen=True, kw_only=True)
class Reciprocating:
    """A reciprocating pump: ``type`` gives C and ``liquid`` gives k of the acceleration head, where they are not stated.

    ``stabiliser`` is ``fitted``, ``none`` or empty.
    """

    type: str
    C: Given | None
    liquid: str
    k: Given | None
    stabiliser: str
    provenance: Provenance
    key: str
    line: int
    column: int


@dataclass(frozen=True, kw_only=True)
class Pump:
    """One pump; ``flow`` always has ``highest``, ``datum`` is its NPSH datum in words.

    ``arrangement`` is ``wet_pit`` for a pump that hangs in its sump, else empty; ``running`` how many run at most;
    ``eyes`` 2 for a double-suction impeller, 0 where absent; ``speed`` is that of operation.
    """

    name: str
    flow: Extremes
    datum_elevation: Given
    datum: str
    arrangement: str
    running: int
    eyes: int
    speed: Given | None
    best_efficiency_flow: Given | None
    npsh_required: NpshRequired
    reciprocating: Reciprocating | None
    provenance: Provenance
    key: str
    line: int
    column: int


@dataclass(frozen=True, kw_only=True)
class Intake:
    """The mouth of the suction line in the free surface; ``elevation`` is that of ``reference``."""

    inlet_diameter: Given
    reference: Literal["bell_lip", "inlet_centreline", "inlet_mouth"]
    elevation: Given


@dataclass(frozen=True, kw_only=True)
class Choice:
    """A published method or service that a criterion names, with the origin of the choice."""

    name: str
    provenance: Provenance


@dataclass(frozen=True, kw_only=True)
class Criteria:
    """What must be met: ``ratio``, ``difference`` or both, else those of a ``service``; the rest where it is asked for.

    ``submergence`` names a method; ``velocity`` is the most in the line, ``bell_velocity`` the window at the bell, or, both
    ends absent with ``bell_method``, that of a standard; ``straight_run`` in diameters; ``operating_region`` in per cent of
    the best-efficiency flow; ``suction_specific_speed`` the most, in the units ``US`` or ``metric`` of
    ``suction_specific_speed_in``; ``vapour_clearance`` the head kept over vapour pressure along the line;
    ``loop_pressure`` the lowest gauge pressure in a closed loop.
    """

    ratio: Given | None
    difference: Given | None
    service: Choice | None
    submergence: Choice | None
    velocity: Given | None
    bell_velocity: Extremes | None
    bell_method: Choice | None
    straight_run: Given | None
    operating_region: Extremes | None
    suction_specific_speed: Given | None
    suction_specific_speed_in: str
    vapour_clearance: Given | None
    loop_pressure: Given | None


@dataclass(frozen=True, kw_only=True)
class Gauge:
    """The suction gauge; ``tap_elevation`` is always set for a dry ``leg``, ``span`` are the ends of its scale."""

    pressure: Given
    elevation: Given
    leg: Literal["filled", "dry"]
    tap: Pipe
    tap_elevation: Given | None
    span: Extremes | None


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
class Case:
    """A state by how it differs from the most unfavourable one; what does not differ is ``None``, ``strainers`` empty."""

    name: str
    flow: Given | None
    running: int | None
    level: Given | None
    temperature: Given | None
    pressure: Given | None
    strainers: str
    provenance: Provenance
    key: str
    line: int
    column: int


@dataclass(frozen=True, kw_only=True)
class Intended:
    """A finding, by its name, that the file states as intended, and why it is."""

    name: str
    reason: str


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
    cases: tuple[Case, ...]
    readings: tuple[Reading, ...]
    intended: tuple[Intended, ...]
    path: str
    named: str
    raw: bytes
    sha256: str
