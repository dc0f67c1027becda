"""From an evaluation to text: terminal, JSON, HTML page, figures."""
