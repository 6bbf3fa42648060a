"""What is said of the files of ``sample_inputs/faults`` whose line cannot be."""

from __future__ import annotations

from expected_document import Faults

LINE: dict[str, Faults] = {
    "two_entrances": [
        ("shape: bell", "line.sections[P1].elements[4]", "one entrance, at the supply", "the supply of the second")
    ],
    "size_without_schedule": [("      size: DN 150", "line.sections[P1].schedule", "`schedule`", "schedule: STD")],
    "no_bore": [("- id: P1", "line.sections[P1]", "`size` with `schedule`, or `bore`", "bore: ")],
    "fitting_without_k": [
        ("kind: fitting", "line.sections[P1].elements[4]", "`K`, `L_over_D`, `Cv` or `Kv`", "`K: 0.1`")
    ],
    "key_of_another_kind": [("radius: long}", "line.sections[P1].elements[2].radius", "length", "leave it out")],
    "choice_near_miss": [("gatee", "line.sections[P1].elements[4].type", "swing_check", "`gate`")],
    "hazen_williams_for_glycol": [
        ("loss_method: hazen_williams", "line.loss_method", "darcy_weisbach: the method of Hazen", "`darcy_weisbach`"),
        ("id: P1", "line.sections[P1].hazen_williams_C", "the key `hazen_williams_C` for", "`hazen_williams_C: 120`"),
    ],
    "coefficient_of_another_method": [
        (
            "hazen_williams_C: 120",
            "line.sections[P1].hazen_williams_C",
            "no `hazen_williams_C`: it is for",
            "`loss_method`",
        )
    ],
    "coefficient_out_of_range": [("1.2", "line.sections[P1].hazen_williams_C", "from 20 to 200", "the decimal point")],
    "axis_length_negative": [("-8.5 m", "line.sections[P1].axis_length", "above zero", "")],
    "withheld_head_negative": [("-0.5 m", "line.withheld_head", "zero or more", "")],
    "condition_without_material": [("condition: rusty", "line.sections[P1].condition", "new or aged", "")],
    "sections_out_of_order": [
        (
            "3, elements: [{id: 1, ki",
            "line.sections[H1].pumps",
            "a number not above that of the",
            "list the sections from t",
        )
    ],
    "number_of_pumps": [
        ("pumps: 0", "line.sections[P1].pumps", "a whole number from 1 to 20", ""),
        ("2.5", "pump.running", "a whole number", ""),
        ("eyes: 3", "pump.eyes", "1 or 2", ""),
    ],
    "set_mixed_unawares": [
        ("hooper_2k}", "line.sections[P1].elements[3].set", "the set of the line, crane: sets rest", "`set`")
    ],
    "set_beside_a_figure": [
        ("crane}", "line.sections[P1].elements[4].set", "no `set` beside `K`, which goes", "leave one of the two out")
    ],
    "mixed_sets_choice": [("mixed_sets: allowed", "line.mixed_sets", "intended", "")],
    "not_in_the_set": [
        ("sharp}", "line.sections[P1].elements[1].shape", "flush, inward, bell, rounded 0.02,", "`flush`"),
        (
            "60, radius: long, count:",
            "line.sections[P1].elements[3].angle",
            "90 degrees with radius long, of the",
            "state its K with its sou",
        ),
        ("check valve}", "line.sections[P1].elements[4].type", "gate, globe, angle, ball, plug,", "`swing_check`"),
        ("runn}", "line.sections[P1].elements[T1].flow", "run or branch, of the set Crane TP-410", "`run`"),
        (
            "7D}",
            "line.sections[P1].elements[B1].radius",
            "standard, short, long, 2D, 3D, 4D,",
            "state its K with its sou",
        ),
    ],
    "two_ways_of_a_loss": [
        ("45, K: 0.2}", "line.sections[P1].elements[3].angle", "no `angle` beside `K`: it belongs to", "`name`"),
        (
            "{id: 4, kind: valve, typ",
            "line.sections[P1].elements[4]",
            "one of `type`, `K`, `L_over_D`, `Cv`",
            "keep one",
        ),
        (
            "{id: J1, kind: fitting",
            "line.sections[P1].elements[J1]",
            "one of `K`, `L_over_D`, `Cv` or `Kv`",
            "keep one",
        ),
        ("150 m³/h}", "line.sections[P1].elements[J2].at_flow", "no `at_flow` beside `K`: it belongs", "`name`"),
    ],
    "no_way_of_a_loss": [
        (
            "{id: 1, kind: entrance}",
            "line.sections[P1].elements[1]",
            "`shape` or `K` of the entrance",
            "`shape: flush`",
        ),
        (
            "{id: 4, kind: valve}",
            "line.sections[P1].elements[4]",
            "one of `type`, `K`, `L_over_D`, `Cv`",
            "`type: gate`",
        ),
        (
            "{id: E1, kind: equipment",
            "line.sections[P1].elements[E1]",
            "one of `K`, `loss` or `curve` of the",
            "`K: 0.1`",
        ),
        (
            "{id: E2, kind: connector",
            "line.sections[P1].elements[E2].at_flow",
            "`at_flow` beside `loss`",
            "`at_flow: 320 m³/h`",
        ),
    ],
    "coefficients_with_units": [
        ("640 m³/h}", "line.sections[P1].elements[4].Kv", "a plain number above zero, without a", ""),
        ("0}", "line.sections[P1].elements[V2].Cv", "a plain number above zero, without a", ""),
        ("8 D}", "line.sections[P1].elements[V3].L_over_D", "a plain number of diameters, without", "`8`"),
    ],
    "reducer_ends": [
        (
            "{id: R1, kind: reducer",
            "line.sections[P1].elements[R1]",
            "`to`, the pipe it leads to, or",
            "`to: {bore: 202.7 mm}`",
        ),
        (
            "{id: R2, kind: reducer",
            "line.sections[P1].elements[R2]",
            "`to`, the pipe it leads to, or",
            "keep the one that is not",
        ),
        (
            "{bore: 154 mm}",
            "line.sections[P1].elements[R2].from",
            "no pipe of this section before",
            "a section of its own",
        ),
        (
            "DN 100}}",
            "line.sections[P1].elements[R3].to.schedule",
            "`schedule` beside `size`: a nominal",
            "`schedule: STD`",
        ),
    ],
    "pipe_behind_a_reducer": [
        (
            "to: {bore: 100 mm}}",
            "line.sections[P1].elements[R1].to",
            "no pipe of this section after",
            "a section of its own",
        )
    ],
    "reducer_flat_side": [
        (
            "{id: R1, kind: reducer",
            "line.sections[P1].elements[R1].flat_side",
            "`flat_side` of an eccentric reducer,",
            "`flat_side: top`",
        ),
        (
            "top, to: {bore: 100 mm}}",
            "line.sections[P1].elements[R2].flat_side",
            "no `flat_side` of a concentric reducer",
            "`type: eccentric`",
        ),
        ("excentric, flat_side: up", "line.sections[P1].elements[R3].type", "concentric or eccentric", "`eccentric`"),
        ("up, to: {bore: 100 mm}}", "line.sections[P1].elements[R3].flat_side", "top or bottom", "`top`"),
    ],
    "loss_curve_out_of_order": [
        (
            "100 m³/h, loss: 6 kPa}]}",
            "line.sections[P1].elements[E1].curve[2].flow",
            "a flow above that of the one before it",
            "list them in rising flow",
        ),
        (
            "6 kPa}]}",
            "line.sections[P1].elements[E1].curve[2].loss",
            "a head, as for the one before it",
            "write both as a head or ",
        ),
        (
            "- {id: E2, kind: equipment, name: meter,",
            "line.sections[P1].elements[E2].curve",
            "a list of at least 2",
            "",
        ),
    ],
    "fouled_without_figure": [
        ("strainers: fouled", "readings[1].strainers", "`clean`, or a `fouled` drop of STR-3", "`fouled`")
    ],
    "element_without_place": [
        (
            '0.4, drawing: ""}',
            "line.sections[P1].elements[4].elevation",
            "an elevation, such as 0.67 m or 4.0 ft",
            "`0.4 m`",
        ),
        ('""}', "line.sections[P1].elements[4].drawing", "a text", ""),
    ],
}
