"""The commands of the command line, one module each: every place of the browser has its plain twin here."""
