/** A check as it stands in a module's source. Names of components are blue and bold, the rest is told by weight. */
const LINES = [
  { tag: "Check", rest: ' id="present" kind="satellites" minutes={40} needs={4}>' },
  { text: "Find which satellites are in the capture, and where." },
  { tag: "Quantity", rest: ' of="found" critical />' },
  { tag: "Quantity", rest: ' of="codePhase" tolerance="0.5 chip" />' },
  { tag: "Quantity", rest: ' of="doppler" tolerance="250 Hz" />' },
  { tag: "/Check", rest: ">" },
];

export function ExampleModule() {
  return (
    <pre className="overflow-x-auto text-code" tabIndex={0} aria-label="Example: a check in the source of a module">
      {LINES.map((line, at) => (
        <span key={at} className="block">
          <span className="mr-5 inline-block w-[2ch] text-right text-ink-3 select-none" aria-hidden>
            {at + 31}
          </span>
          {line.tag ? (
            <>
              &lt;<b className="font-bold text-plus">{line.tag}</b>
              {line.rest}
            </>
          ) : (
            line.text
          )}
        </span>
      ))}
    </pre>
  );
}
