"""What people and programs see of an answer."""
