"""The formula language: what it refuses, and that text and tree are one thing."""

from __future__ import annotations

import random
from fractions import Fraction

import pytest

from calcpack import formula
from calcpack.formula import NONE, Bin, Call, Cmp, FormulaError, Name, Neg, Node, Num, names, parse, text, walk
from calcpack.symbols import DIMENSIONS

REFUSED = (
    ("", "not a formula"),
    ("a b", "not a formula"),
    ("a +", "not a formula"),
    ("a; b", "not a formula"),
    ("a = b", "not a formula"),
    ("(a", "not a formula"),
    ("a\n+ b", "not a formula"),
    ("a # b", "not a formula"),
    ("ρ * V", "not a formula"),
    ("a\x00", "not a formula"),
    ("-" * 5000 + "a", "not a formula"),
    ("(" * 300 + "a" + ")" * 300, "not a formula"),
    ("a.b", "'a.b' is outside the formula language"),
    ("a[0]", "outside the formula language"),
    ("a // b", "'a // b' is outside the formula language"),
    ("a % b", "outside the formula language"),
    ("a @ b", "outside the formula language"),
    ("+a", "'+a' is outside the formula language"),
    ("~a", "outside the formula language"),
    ("not a", "outside the formula language"),
    ("a and b", "outside the formula language"),
    ("a if b else c", "outside the formula language"),
    ("lambda: a", "outside the formula language"),
    ("(a := b)", "outside the formula language"),
    ("[a, b]", "outside the formula language"),
    ("a, b", "outside the formula language"),
    ("'a'", "outside the formula language"),
    ("True", "outside the formula language"),
    ("None", "outside the formula language"),
    ("1j", "outside the formula language"),
    ("...", "outside the formula language"),
    ("sin(a)", "'sin(a)' is outside the formula language"),
    ("abs(a)", "outside the formula language"),
    ("__import__('os')", "outside the formula language"),
    ("a(b)", "outside the formula language"),
    ("a.sqrt(b)", "outside the formula language"),
    ("sqrt(x=a)", "outside the formula language"),
    ("sqrt(*a)", "outside the formula language"),
    ("sqrt()", "sqrt takes 1"),
    ("sqrt(a, b)", "sqrt takes 1"),
    ("max(a)", "max takes two or more"),
    ("min()", "min takes two or more"),
    ("sum(a, b)", "sum takes 1"),
    ("sum(a + b)", "sum takes one symbol"),
    ("sum(3)", "sum takes one symbol"),
    ("a < b < c", "outside the formula language"),
    ("(a < b) + 1", "outside the formula language"),
    ("sqrt(a < b)", "outside the formula language"),
    ("a != b", "outside the formula language"),
    ("a is b", "outside the formula language"),
    ("0x10", "not a plain decimal number"),
    ("0b1", "not a plain decimal number"),
    ("1_000", "not a plain decimal number"),
    ("1e5", "not a plain decimal number"),
)


@pytest.mark.parametrize(("written", "reason"), REFUSED, ids=[t[:20] for t, _ in REFUSED])
def test_text_outside_the_language_is_refused_with_the_reason(written: str, reason: str) -> None:
    with pytest.raises(FormulaError) as caught:
        parse(written)
    assert reason in str(caught.value)


READ: tuple[tuple[str, Node], ...] = (
    ("3", Num("3")),
    ("2.30", Num("2.30")),
    ("pi", Name("pi")),
    ("-a", Neg(Name("a"))),
    ("-a**2", Neg(Bin("**", Name("a"), Num("2")))),
    ("(-a)**2", Bin("**", Neg(Name("a")), Num("2"))),
    ("a**-b", Bin("**", Name("a"), Neg(Name("b")))),
    ("a**b**c", Bin("**", Name("a"), Bin("**", Name("b"), Name("c")))),
    ("a - b - c", Bin("-", Bin("-", Name("a"), Name("b")), Name("c"))),
    ("a - (b - c)", Bin("-", Name("a"), Bin("-", Name("b"), Name("c")))),
    ("a / b / c", Bin("/", Bin("/", Name("a"), Name("b")), Name("c"))),
    ("a / (b * c)", Bin("/", Name("a"), Bin("*", Name("b"), Name("c")))),
    ("-2 * a", Bin("*", Neg(Num("2")), Name("a"))),
    ("sum(h)", Call("sum", (Name("h"),))),
    ("max(a, b, c)", Call("max", (Name("a"), Name("b"), Name("c")))),
    ("a >= b", Cmp(">=", Name("a"), Name("b"))),
    ("a + b == c", Cmp("==", Bin("+", Name("a"), Name("b")), Name("c"))),
)


@pytest.mark.parametrize(("written", "tree"), READ)
def test_a_formula_is_read_as_python_reads_it(written: str, tree: Node) -> None:
    assert parse(written) == tree


SHORTEST = (
    ("-2 * log10(x)", "-2 * log10(x)"),
    ("((a) + (b))", "a + b"),
    ("(a * b) / c", "a * b / c"),
    ("a * (b / c)", "a * (b / c)"),
    ("(a**b)**c", "(a**b)**c"),
    ("a**(b**c)", "a**b**c"),
    ("a - (-b)", "a - (-b)"),
    ("(-a) + b", "-a + b"),
    ("(a + b) >= (c)", "a + b >= c"),
    ("1 / sqrt(f) == (-2) * log10(r)", "1 / sqrt(f) == -2 * log10(r)"),
)


@pytest.mark.parametrize(("written", "short"), SHORTEST)
def test_text_has_no_parentheses_it_does_not_need(written: str, short: str) -> None:
    assert text(parse(written)) == short


SYMBOLS = ("a", "b", "rho", "NPSHA_d", "h_L", "pi")


def random_tree(rng: random.Random, depth: int, top: bool = True) -> Node:
    """A random tree of the language."""
    if top and rng.random() < 0.2:
        return Cmp(
            rng.choice((">=", "<=", ">", "<", "==")), random_tree(rng, depth, False), random_tree(rng, depth, False)
        )
    if depth == 0 or rng.random() < 0.15:
        number = rng.choice(("0", "7", "3.70", "2.51", "34560", "0.0065", "12345678901234567890", "0.00000012"))
        return parse(number) if rng.random() < 0.4 else Name(rng.choice(SYMBOLS))
    kind = rng.random()
    if kind < 0.15:
        return Neg(random_tree(rng, depth - 1, False))
    if kind < 0.3:
        fn = rng.choice(("sqrt", "log10", "ln", "exp", "max", "min", "sum"))
        if fn == "sum":
            return Call(fn, (Name(rng.choice(SYMBOLS)),))
        return Call(
            fn,
            tuple(
                random_tree(rng, depth - 1, False) for _ in range(2 + rng.randrange(2) if fn in ("max", "min") else 1)
            ),
        )
    return Bin(
        rng.choice("+-*/") if kind < 0.85 else "**",
        random_tree(rng, depth - 1, False),
        random_tree(rng, depth - 1, False),
    )


def test_text_read_back_is_the_tree() -> None:
    rng = random.Random(1)
    for _ in range(4000):
        tree = random_tree(rng, rng.randrange(1, 5))
        written = text(tree)
        if len(written) <= formula.LONGEST:
            assert parse(written) == tree, written


@pytest.mark.campaign
def test_text_of_many_trees_read_back_is_the_tree() -> None:
    rng = random.Random(2)
    for _ in range(200_000):
        tree = random_tree(rng, rng.randrange(1, 5))
        if len(text(tree)) <= formula.LONGEST:
            assert parse(text(tree)) == tree, text(tree)


def test_two_trees_never_share_a_text() -> None:
    rng = random.Random(3)
    seen: dict[str, Node] = {}
    for _ in range(4000):
        tree = random_tree(rng, 3)
        assert seen.setdefault(text(tree), tree) == tree


SMALL = ("0.0000001", "0.00000012", "0.0065", "100000000000000000000")


@pytest.mark.parametrize("written", SMALL)
def test_a_small_or_large_number_reads_back(written: str) -> None:
    assert parse(text(parse(written))) == parse(written)
    assert Fraction(text(parse(written))) == Fraction(written)


def test_names_come_once_and_in_order() -> None:
    assert names(parse("pi * D**2 / 4 + D * x - sqrt(A)")) == ("D", "x", "A")
    assert [type(n).__name__ for n in walk(parse("-a + 2"))] == ["Bin", "Neg", "Name", "Num"]


def test_the_fingerprint_changes_with_the_formula_only() -> None:
    assert formula.fingerprint(parse("a+b")) == formula.fingerprint(parse("(a) + b"))
    assert formula.fingerprint(parse("a + b")) != formula.fingerprint(parse("b + a"))
    assert len(formula.fingerprint(parse("a"))) == 12


# --- dimensions -------------------------------------------------------------------------------------------------------

BALANCED = (
    ("V**2 / (2 * g)", "h_V"),
    ("rho * V * D / mu", "Re"),
    ("sqrt(g * D)", "V"),
    ("max(H_s, H_v)", "z"),
    ("sum(h)", "h_L"),
    ("A**(1 / 2)", "D"),
    ("A**0.5", "D"),
    ("(D / L)**(Re / 2)", "Re"),
    ("exp(D / L)", "Re"),
    ("-p_b", "p_g"),
    ("Q / A >= V", "V"),
    ("(g * D)**-0.5 * V", "Re"),
)


@pytest.mark.parametrize(("written", "like"), BALANCED)
def test_a_dimension_follows_the_tree(written: str, like: str) -> None:
    assert formula.dimension(parse(written), DIMENSIONS) == DIMENSIONS[like]


UNBALANCED = (
    ("D + V", "differ in dimension"),
    ("D - 1", "differ in dimension"),
    ("Q >= V", "differ in dimension"),
    ("D**V", "exponent must be a pure number"),
    ("D**Re", "constant exponent"),
    ("D**sqrt(2)", "plain number or a fraction"),
    ("log10(D)", "log10 takes a pure number"),
    ("exp(T)", "exp takes a pure number"),
    ("max(D, V)", "arguments differ"),
    ("nobody + D", "not in the nomenclature"),
)


@pytest.mark.parametrize(("written", "reason"), UNBALANCED)
def test_a_formula_that_does_not_balance_is_refused(written: str, reason: str) -> None:
    with pytest.raises(FormulaError, match=reason):
        formula.dimension(parse(written), DIMENSIONS)


def test_pi_and_numbers_have_no_dimension() -> None:
    assert formula.dimension(parse("2 * pi"), DIMENSIONS) == NONE
