"""The page: a record set as a calculation package.  Needs nothing but the record."""
