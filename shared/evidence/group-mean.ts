import { listInWords } from './words.ts';
import { toScalar } from './to-finding.ts';
import type { Reading } from './evidence.ts';
import { fault, isFault } from './fault.ts';
import type { Fault, Group, Scalar } from './findings.ts';
import { settingsKey } from './keys.ts';
import { meanOfRows } from './mean-of-group.ts';
import { rowsWithValue, settingOf } from './place.ts';
import { seriesName, symbolName, type Register } from './register.ts';
import type { Values } from './values.ts';

/** The group of a series at some settings, or that there is none. */
export function groupAt(
  values: Values,
  series: string,
  at: Readonly<Record<string, Reading>>,
): Group | Fault {
  if (!values.register.series.has(series))
    return fault('source gone', 'The series is gone. Choose another.', series);
  const key = series + settingsKey(at);
  const found = values.groups(series).find((group) => group.key === key);
  if (found !== undefined) return found;
  return fault(
    'no trials',
    `${capital(seriesName(values.register, series))} has no trial at ${settingsInWords(values.register, at)}.`,
    series,
  );
}

/** "θ = 38 ° and h = 20 cm". */
export function settingsInWords(register: Register, at: Readonly<Record<string, Reading>>): string {
  const settings = Object.keys(at).map((id) => {
    const { text, unit } = at[id] ?? { text: '', unit: '' };
    const gap = unit === '' || unit === '1' ? '' : unit === '°' ? unit : `\u00a0${unit}`;
    return `${symbolName(register, id)} = ${text}${gap}`;
  });
  return settings.length === 0 ? 'any setting' : listInWords(settings);
}

/** Mean of a quantity over the kept trials of a group; of a setting, the setting itself. */
export function meanAt(values: Values, quantity: string, group: Group): Scalar | Fault {
  const { register } = values;
  const finding = values.finding(quantity, group.series);
  if (isFault(finding) || finding.shape === 'scalar') return finding;
  const rows = rowsWithValue(finding, group.kept);
  const symbol = symbolName(register, quantity);
  if (rows.length === 0)
    return fault(
      'no trials',
      `${capital(seriesName(register, group.series))} has no kept trial with ${symbol} at ${settingsInWords(register, group.settings)}.`,
      group.series,
    );
  const freedomOf = (id: string) => values.freedomOf(id);
  if (group.settings[quantity] !== undefined)
    return toScalar(settingOf(finding, group, `set:${quantity}@${group.key}`), {
      unit: finding.unit,
      madeOf: { kind: 'entered' },
      warnings: [],
      freedomOf,
    });
  return meanOfRows(
    { column: finding, rows, leftOut: group.excluded, source: `mean:${quantity}@${group.key}` },
    freedomOf,
  );
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
