"""calcpack: a calculation package for a pump's suction side, line by line."""

__version__ = "0.1.0"
