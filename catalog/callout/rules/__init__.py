"""The rules of the language, each a function that says its rule: names first, then sizes and limits, then figures."""
