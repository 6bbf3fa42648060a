"""The physics: states, supplies, liquids, lines and pumps, from the records of an input file to addressed values."""
