/** Named parameters for SQL built from the dictionary: `:site` becomes `$n` and its value the n-th. A cast (`::text`) stays as it is. */
export function bind(sql: string, values: Readonly<Record<string, unknown>>): [text: string, parameters: unknown[]] {
  const order: string[] = [];
  const text = sql.replace(/(?<!:):([a-z]+)\b/g, (_match, name: string) => {
    if (!(name in values)) throw new RangeError(`No value was given for the parameter ${name}.`);
    if (!order.includes(name)) order.push(name);
    return `$${order.indexOf(name) + 1}`;
  });
  return [text, order.map((name) => values[name])];
}
