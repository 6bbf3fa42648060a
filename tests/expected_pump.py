"""What is said of the files of ``sample_inputs/faults`` whose pump, criteria or readings cannot be."""

from __future__ import annotations

from expected_document import Faults

PUMP: dict[str, Faults] = {
    "cases_of_nothing": [
        ("name: as ever", "cases[1]", "something that differs from the most", "leave the case out"),
        ("running: 2", "cases[2].running", "at most 1, the pumps", ""),
        ("temperature: lowest", "cases[3].temperature", "(normal or highest)", "`lowest`"),
        ("pressure: 20", "cases[3].pressure", "not in the file", "leave it out"),
        ("flow: 90", "cases[4].flow", "a flow", "`90 m³/h`"),
        ("level: 1 kPa", "cases[4].level", "an elevation", ""),
        ("dirty", "cases[4].strainers", "clean or fouled", ""),
        ("name: Odd", "cases[5].name", "each name once", ""),
        ("20 mm", "cases[5].temperature", "a temperature", ""),
        ("running: 0", "cases[5].running", "a whole number from 1 to 20", ""),
    ],
    "dry_leg": [("leg: dry", "readings[1].gauge.tap_elevation", "`tap_elevation`", "`tap_elevation`")],
    "strainer_state": [("- name: commissioning", "readings[1].strainers", "STR-3", "")],
    "margin_missing": [("npsh_margin:", "criteria.npsh_margin", "`ratio`, `difference`", "ratio: ")],
    "lowest_flow_above_normal": [("120 m³/h, highest: 150 m", "pump.flow.normal", "a value not below `lowest`", "")],
    "speed_of_the_pump_alone": [
        ("value: 4.2 m", "pump.npsh_required.speed", "`speed` of the curve beside the", "`speed: 1180 r/min`")
    ],
    "speed_exponent": [("speed_exponent: 4", "pump.npsh_required.speed_exponent", "from 1 to 3", "the decimal point")],
    "best_efficiency_flow_as_a_share": [("80 %", "pump.best_efficiency_flow", "% measures a percentage", "")],
    "npsh_in_two_ways": [
        (
            "[{flow: 100 m³/h, npsh:",
            "pump.npsh_required.points",
            "either `points`, or `value` with",
            "leave one of the two out",
        )
    ],
    "npsh_without_flow": [
        ("value: 4.2 m", "pump.npsh_required.at_flow", "`at_flow` beside `value`: NPSH", "`at_flow: 320 m³/h`"),
        (
            "interpolation: linear",
            "pump.npsh_required.interpolation",
            "no `interpolation` without `points`",
            "leave it out",
        ),
    ],
    "npsh_missing": [
        ("speed: 1480 r/min", "pump.npsh_required", "`value` with `at_flow`, or `points`", "`value: 7.8 m`")
    ],
    "npsh_points_out_of_order": [
        (
            "100 m³/h, npsh: 3.1 m}",
            "pump.npsh_required.points[2].flow",
            "a flow above that of the one before it",
            "list them in rising flow",
        ),
        (
            "100 m³/h, npsh: 3.0 m}]",
            "pump.npsh_required.points[3].flow",
            "a flow above that of the one before it",
            "list them in rising flow",
        ),
        ("interpolation: cubic", "pump.npsh_required.interpolation", "linear or smooth", ""),
    ],
    "npsh_basis": [
        ("basis: NPSHi", "pump.npsh_required.basis", "NPSH3 or other", "`other`"),
        ("0.4", "pump.npsh_required.datum_elevation", "an elevation, such as 0.67 m or 4.0 ft", "`0.4 m`"),
    ],
    "reciprocating_incomplete": [
        ("name: P-3 A/B", "pump.speed", "`speed` of a reciprocating pump, on", "`speed: 1180 r/min`"),
        (
            "{stabiliser: installed}",
            "pump.reciprocating.type",
            "`type`, or the coefficient `C` itself",
            "`type: simplex single-acting`",
        ),
        (
            "{stabiliser: installed}",
            "pump.reciprocating.liquid",
            "`liquid`, or the coefficient `k` itself",
            "`liquid: deaerated water`",
        ),
        ("installed}", "pump.reciprocating.stabiliser", "fitted or none", ""),
    ],
    "reciprocating_coefficients": [
        ("{type: triplex plunger", "pump.reciprocating", "a `line` before a reciprocating pump:", "`line:`"),
        ("triplex plunger, C: 0, l", "pump.reciprocating.type", "simplex single-acting, simplex", "`triplex`"),
        ("0, liquid: oil, k: 1.4 m", "pump.reciprocating.C", "a plain number above zero, without a", ""),
        ("oil, k: 1.4 m}", "pump.reciprocating.liquid", "deaerated water, water, hydrocarbon", "`hot oil`"),
        ("1.4 m}", "pump.reciprocating.k", "a plain number above zero, without a", ""),
    ],
    "service_not_known": [
        ("boiler-feed}", "criteria.npsh_margin.service", "hydrocarbon, chemical, water,", "`boiler feed`")
    ],
    "criteria_out_of_form": [
        ("2.4 m", "criteria.velocity", "a velocity, such as 2.4 m/s or 8 ft/s", ""),
        ("5 D", "criteria.straight_run", "a plain number of diameters, without", "`5`"),
        ("5 kPa", "criteria.vapour_clearance", "a head of the liquid, such as 0.6 m", ""),
        ("110 kPa absolute", "criteria.loop_pressure", "a gauge pressure, such as 10 kPa", ""),
    ],
    "windows_reversed": [
        ("1.2 m/s}", "criteria.bell_velocity.highest", "a value above `lowest`", ""),
        ("70 %}", "criteria.operating_region.highest", "a value above `lowest`", ""),
    ],
    "windows_in_two_ways": [
        ("{highest: 1.7 m/s, metho", "criteria.bell_velocity", "either `lowest`, `highest` or both,", "leave one out"),
        ("{source: S1 4.4}", "criteria.operating_region", "`lowest`, `highest` or both", "`lowest: 70 %`"),
    ],
    "specific_speed_without_units": [
        ("{highest: 11000}", "criteria.suction_specific_speed.in", "the key `in` (Units the number is", "`in: US`")
    ],
    "span_reversed": [("-100 kPa gauge}, tap: {s", "readings[1].gauge.span.highest", "a value above `lowest`", "")],
    "surface_of_an_open_tank": [
        ("4 kPa gauge", "readings[1].surface_pressure", "no `surface_pressure`: only a", "leave it out")
    ],
}
