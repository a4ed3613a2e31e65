"""Runs one benchmark's reference work on request: a line "run" answers with its seconds, "result" with what it gave."""

import json
import sys
import time


def serve(prepare):
    """prepare(folder) returns a function that does the work once and returns something JSON can hold, or an array."""
    work = prepare(sys.argv[1])
    result = None
    print(json.dumps({"ready": True}), flush=True)
    for line in sys.stdin:
        if line.strip() == "run":
            started = time.perf_counter()
            result = work()
            answer = {"seconds": time.perf_counter() - started}
        else:
            answer = {"result": result}
        print(json.dumps(answer, default=lambda array: array.tolist()), flush=True)
