"""What is said of the files of ``sample_inputs/faults`` whose liquid, site or supply cannot be."""

from __future__ import annotations

from expected_document import NOWHERE, Faults

SUPPLY: dict[str, Faults] = {
    "level_order": [("lowest: 3.10 m", "supply.level.normal", "not below `lowest`", "")],
    "temperature_order": [("normal: 34 °C", "liquid.temperature.highest", "not below `normal`", "")],
    "other_liquid": [
        (
            "35 % glycol",
            "liquid.name",
            "density, viscosity and vapour_pressure, each",
            "`ethylene glycol` or `propylene glycol`",
        )
    ],
    "no_barometer": [("weather_allowance", "site", "`barometer`", "barometer: ")],
    "no_weather_allowance": [("elevation: 120 m", "site.weather_allowance", "`weather_allowance`", "1.7 kPa")],
    "blanket_without_pressure": [("name: Wash water tank", "supply.pressure", "`pressure`", "22 kPa gauge")],
    "main_with_level": [
        ("name: Wash water tank", "supply.pressure", "of a main in which a line starts", "`pressure: {lowest: "),
        ("name: Wash water tank", "supply.elevation", "of a main in which a line starts", "`elevation: "),
        ("name: Wash water tank", "supply.velocity_head", "of a main in which a line starts", "`velocity_head: "),
        ("  level:", "supply.level", "for kind main", "leave it out"),
        ("kind: entrance", "line.sections[P1].elements[1]", "the line starts in a pipe", "leave it out"),
    ],
    "line_without_level": [("name: Wash water tank", "supply.level", "a level", "level: ")],
    "nothing_to_calculate": [("calculation:", NOWHERE, "`readings`", "")],
    "extremes_wanted": [
        ("level: 0.80 m", "supply.level", "lowest, normal, highest, overflow or drawdown", "`{lowest: 0.80 m}`")
    ],
    "mixed_measures": [
        ("22 kPa gauge", "supply.pressure.normal", "a gauge pressure, as for `lowest`", "both as an absolute"),
        ("15 kPa", "line.sections[P1].elements[5].drop.fouled", "as for `clean`", "both as a head"),
    ],
    "share_of_water": [("35 %", "liquid.mass_fraction", "for a glycol or a brine", "leave it out")],
    "glycol_without_share": [
        (
            "name: propylene glycol",
            "liquid.mass_fraction",
            "on which the properties of propylene glycol depend",
            "`mass_fraction: 35 %`",
        )
    ],
    "share_as_a_number": [("0.35", "liquid.mass_fraction", "a value needs its unit", "`35 %`")],
    "salinity_in_practical_units": [("35 psu", "liquid.salinity", "is not known", "`35 g/kg`")],
    "liquid_without_viscosity": [("name: acetone", "liquid.viscosity", "not looked up for acetone", "`table`")],
    "coldest_above_normal": [
        ("24 °C, highest: 30 °C, s", "liquid.temperature.normal", "a value not below `lowest`", "")
    ],
    "coldest_alone": [
        ("{lowest: 5 °C, source: S", "liquid.temperature", "`average`, `normal` or `highest`", "`highest`")
    ],
    "reid_vapour_pressure": [
        ("vapour_pressure_kind: reid", "liquid.vapour_pressure_kind", "four volumes of vapour", ""),
        ("rvp: {value: 62", "liquid.rvp", "not the true vapour pressure", "`vapour_pressure`"),
    ],
    "effective_without_figure": [
        (
            "kind: effective",
            "liquid.vapour_pressure",
            "dissolved gas is not looked up",
            "`vapour_pressure: 4.2 kPa absolute`",
        )
    ],
    "raoult_for_water": [
        ("vapour_pressure_of: raoult", "liquid.vapour_pressure_of", "for mixtures with water", "leave it out")
    ],
    "raoult_for_brine": [("vapour_pressure_of: raoult", "liquid.vapour_pressure_of", "falls into ions", "`water`")],
    "table_of_one_row": [("- {temperature: 20 °C, d", "liquid.table", "a list of at least 2", "")],
    "table_not_rising": [
        (
            "20 °C, density: 870 kg/m",
            "liquid.table[2].temperature",
            "a temperature above that of the one",
            "list them in rising temp",
        ),
        (
            "52 mPa·s, vapour_pressur",
            "liquid.table[2].viscosity",
            "a kinematic viscosity, as for the one",
            "write both as a kinemati",
        ),
    ],
    "table_with_gaps": [
        ("heat transfer oil", "liquid.name", "a liquid that is looked up, such as", "`table`"),
        ("{temperature: 20 °C, den", "liquid.table[1]", "a table row with a source", "`source:`"),
        ("{temperature: 30 °C, den", "liquid.table[2]", "the properties of the first row", ""),
    ],
    "overflow_below_highest": [("2.40 m, source: S1 2.2", "supply.level.overflow", "a value not below `highest`", "")],
    "drawdown_negative": [("-0.15 m", "supply.level.drawdown", "zero or more", "")],
    "saturated_without_level": [
        ("name: Wash water tank T-", "supply.level", "the key `level` for kind saturated", "`level: {lowest: 0.67 m}`")
    ],
    "loop_without_its_point": [
        (
            "name: Wash water tank T-",
            "supply.pressure",
            "the key `pressure` for kind loop",
            "`pressure: {lowest: 22 kPa gauge}`",
        ),
        ("name: Wash water tank T-", "supply.elevation", "the key `elevation` for kind loop", "`elevation: 0.67 m`"),
        (
            "name: Wash water tank T-",
            "supply.point",
            "the key `point` for kind loop (Where",
            "`point: connection of the expansion vessel`",
        ),
        (
            "name: Wash water tank T-",
            "supply.velocity_head",
            "the key `velocity_head` for kind loop",
            "`velocity_head: counted`",
        ),
    ],
    "loop_with_a_surface": [
        (
            "level: {lowest: 0.80 m}",
            "supply.level",
            "one of the keys name, kind, pressure,",
            "leave it out for kind lo",
        ),
        (
            "{id: 1, kind: entrance",
            "line.sections[P1].elements[1]",
            "no entrance for kind loop: the line",
            "leave it out, or give a ",
        ),
        ("{inlet_diameter: 300 mm", "intake", "no `intake` for kind loop: it has no", "leave it out"),
    ],
    "high_point_of_a_tank": [
        ("high_point: 3.0 m", "supply.high_point", "one of the keys name, kind or level", "leave it out for kind op")
    ],
    "velocity_head_choice": [("velocity_head: counts", "supply.velocity_head", "counted or left_out", "`counted`")],
    "main_without_line": [("{lowest: 210 kPa gauge}", "supply.pressure", "of a main without a `line`", "leave it out")],
    "entrance_too_late": [
        ("{id: 1, kind: entrance", "line.sections[P1].elements[1]", "the entrance as the first element:", "move it up")
    ],
    "wet_pit_with_line": [("fitting_set: crane", "line", "NPSH counts from its bell", "`pump.arrangement`")],
    "wet_pit_in_a_main": [("kind: main", "supply.kind", "a free surface for a wet-pit pump", "")],
}
