import { useEffect, useRef } from 'react';
import type { RecordReading } from '../../../core/motion/reading.ts';
import type { ImportFile } from '../../../state/importQueue.ts';
import { count } from './words.ts';

/** The file as it stands, with what was found in it underlined. */
export function RawText({ file }: { readonly file: ImportFile }) {
  const { answer } = file;
  const box = useRef<HTMLElement>(null);
  const stop = answer?.reading.faults[0]?.line ?? null;
  // Scrolled to the line that stopped the reading, once for each; else the file is shown from its top.
  // biome-ignore lint/correctness/useExhaustiveDependencies: another file is scrolled anew
  useEffect(() => {
    const line = box.current?.querySelector<HTMLElement>('.raw-line.stopped');
    if (!box.current) return;
    box.current.scrollTop = line ? line.offsetTop - box.current.clientHeight / 2 : 0;
  }, [file.id, stop]);
  return (
    <div className="import-raw">
      <h3 className="import-caption">{file.file}, as it stands</h3>
      {/* biome-ignore lint/a11y/noNoninteractiveTabindex: a box that scrolls must be reached by the keyboard */}
      <section ref={box} className="raw" aria-label={`Text of ${file.file}`} tabIndex={0}>
        {answer && <Lines answer={answer} />}
      </section>
    </div>
  );
}

function Lines({ answer: { excerpt, lines, reading } }: { readonly answer: NonNullable<ImportFile['answer']> }) {
  const shown = [];
  let next = 1;
  for (const { line, text } of excerpt) {
    if (line > next) shown.push(<Gap key={`gap ${line}`} lines={line - next} />);
    if (line === reading.firstLine && reading.values.length > 0) {
      shown.push(
        <p key="from here" className="raw-note accent">
          {fromHere(reading)}
        </p>,
      );
    }
    const faults = reading.faults.filter((fault) => fault.line === line);
    shown.push(
      <div key={line} className={`raw-line ${faults.length > 0 ? 'stopped' : ''}`}>
        <i>{line}</i>
        <span>{marked(text, spansOf(reading, line))}</span>
      </div>,
    );
    for (const fault of faults)
      shown.push(
        <p key={fault.id} className="raw-note signal">
          {fault.message}
        </p>,
      );
    next = line + 1;
  }
  if (next <= lines) shown.push(<Gap key="rest" lines={lines - next + 1} />);
  return shown;
}

function Gap({ lines }: { readonly lines: number }) {
  return <p className="raw-note quiet">{count(lines, 'more line')}</p>;
}

function fromHere({ layout, perLine }: RecordReading): string {
  if (layout === 'time-and-acceleration') return `From here, ${count(perLine, 'column')}, a sample a line`;
  return perLine > 1 ? `From here, ${perLine} values a line, read across then down` : 'From here, one value a line';
}

interface Span {
  readonly from: number;
  readonly to: number;
  readonly kind: 'found' | 'stopped';
}

function spansOf({ facts, faults }: RecordReading, line: number): Span[] {
  const found = facts.flatMap((fact): Span[] =>
    fact.line === line && fact.span ? [{ from: fact.span[0], to: fact.span[1], kind: 'found' }] : [],
  );
  const stopped = faults.flatMap((fault): Span[] =>
    fault.line === line && fault.span ? [{ from: fault.span[0], to: fault.span[1], kind: 'stopped' }] : [],
  );
  return [...found, ...stopped].sort((a, b) => a.from - b.from);
}

/** A line's text with its marks; marks that overlap one before are passed over. */
function marked(text: string, spans: readonly Span[]) {
  const parts = [];
  let at = 0;
  for (const { from, to, kind } of spans) {
    if (from < at || to > text.length) continue;
    parts.push(text.slice(at, from));
    parts.push(
      <mark key={from} className={kind}>
        {text.slice(from, to)}
      </mark>,
    );
    at = to;
  }
  return [...parts, text.slice(at)];
}
