"""What the scripts that check written files share."""
import os
import tempfile


class Failed(Exception):
    pass


def expect(condition, words):
    if not condition:
        raise Failed(words)


def check_each(check, program, jobs):
    """Calls check(program, job, folder) for each job, in a folder of its own.

    Prints a line for each with what the check returns, or how it failed; returns an exit code."""
    failures = 0
    for job in jobs:
        with tempfile.TemporaryDirectory() as folder:
            try:
                print(f"{os.path.basename(job)}: as it should be ({check(program, job, folder)})")
            except Failed as failure:
                failures += 1
                print(f"{os.path.basename(job)}: {failure}")
    return 1 if failures or not jobs else 0
