"""The same small problem by several methods: how many combinations a second, and what each finds."""
