/**
 * A design as a plain list, for one that came from elsewhere: a line for each value and part, `frequency: 400 kHz`,
 * `highSwitch: NAME`. Lines that start with # are remarks.
 */
import type { DesignRecord } from './assessment.ts';
import { bad, type Finding, good, type Outcome } from './outcome.ts';
import { parseQuantity } from './quantity/index.ts';
import { ARCHITECTURES, type Architecture } from './stages/list.ts';

/** Values with a unit; every other number is a count. */
const UNITS = { frequency: 'frequency', inductance: 'inductance' } as const;

/** The design that `text` lists; every line that cannot be read is a finding in `file`. */
export function readPlainDesign(text: string, file: string): Outcome<DesignRecord> {
  const findings: Finding[] = [];
  const genes: Record<string, number> = {};
  const parts: Record<string, string> = {};
  let architecture: Architecture | undefined;
  for (const [i, raw] of text.split(/\r?\n/).entries()) {
    const line = raw.trim();
    if (line === '' || line.startsWith('#')) continue;
    const found = /^([A-Za-z]+)\s*:\s*(.+)$/.exec(line);
    const [, name = '', value = ''] = found ?? [];
    const refuse = (allowed: string): void => {
      findings.push({ file, line: i + 1, column: 1, field: name, found: line.slice(0, 80), allowed });
    };
    if (found === null) refuse('name: value, such as frequency: 400 kHz');
    else if (name === 'architecture') {
      architecture = ARCHITECTURES.find((one) => one === value);
      if (architecture === undefined) refuse(ARCHITECTURES.join(', '));
    } else if (name in UNITS) {
      const reading = parseQuantity(value, UNITS[name as keyof typeof UNITS]);
      if (reading.ok) genes[name] = reading.value;
      else refuse(reading.allowed);
    } else if (/^\d+$/.test(value)) genes[name] = Number(value);
    else parts[name] = value;
  }
  if (architecture === undefined && findings.length === 0) {
    findings.push({
      file,
      line: 0,
      column: 0,
      field: 'architecture',
      found: 'nothing',
      allowed: ARCHITECTURES.join(', '),
    });
  }
  return architecture === undefined || findings.length > 0 ? bad(findings) : good({ architecture, genes, parts });
}
