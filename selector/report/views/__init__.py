"""Each answer told as JSON, as a document and as records: a file for each answer, named by its `view`."""
