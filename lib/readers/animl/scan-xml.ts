/** What a scan reports, in the order in which it stands in the text. */
export interface XmlEvents {
  open(name: string, attributes: Readonly<Record<string, string>>, at: number): void;
  text(content: string): void;
  close(name: string): void;
}

/**
 * Go through the elements of an XML text once, from front to back: names without prefix, attributes, text with its
 * entities resolved. Comments, declarations and instructions are passed over. Nothing is fetched and no entity of
 * the document's own is known, so that a text cannot grow while it is read.
 */
export function scanXml(text: string, events: XmlEvents): void {
  let at = 0;
  while (at < text.length) {
    const open = text.indexOf('<', at);
    if (open < 0) return;
    if (open > at) events.text(unescaped(text.slice(at, open)));
    at = text.startsWith('<!--', open)
      ? after(text, '-->', open)
      : text.startsWith('<![CDATA[', open)
        ? cdata(text, open, events)
        : tag(text, open, events);
  }
}

function after(text: string, end: string, from: number): number {
  const found = text.indexOf(end, from);
  return found < 0 ? text.length : found + end.length;
}

function cdata(text: string, open: number, events: XmlEvents): number {
  const end = after(text, ']]>', open);
  events.text(text.slice(open + 9, Math.max(open + 9, end - 3)));
  return end;
}

function tag(text: string, open: number, events: XmlEvents): number {
  const end = tagEnd(text, open);
  const inner = text.slice(open + 1, end - 1);
  if (inner.startsWith('?') || inner.startsWith('!')) return end;
  if (inner.startsWith('/')) {
    events.close(localName(inner.slice(1).trim()));
    return end;
  }
  const empty = inner.endsWith('/');
  const name = localName(/^[^\s/>]*/.exec(inner)?.[0] ?? '');
  events.open(name, attributesOf(inner), open);
  if (empty) events.close(name);
  return end;
}

/** The end of a tag: the first ">" outside quotes. */
function tagEnd(text: string, open: number): number {
  let quote = 0;
  for (let i = open + 1; i < text.length; i++) {
    const code = text.charCodeAt(i);
    if (quote !== 0) {
      if (code === quote) quote = 0;
    } else if (code === 34 || code === 39) quote = code;
    else if (code === 62) return i + 1;
  }
  return text.length + 1;
}

function localName(name: string): string {
  return name.slice(name.indexOf(':') + 1);
}

function attributesOf(inner: string): Record<string, string> {
  const attributes: Record<string, string> = {};
  if (inner.length > 20_000) return attributes;
  for (const [, name = '', double, single] of inner.matchAll(
    /([\w:.-]{1,60})\s{0,9}=\s{0,9}(?:"([^"]*)"|'([^']*)')/g,
  )) {
    attributes[localName(name)] = unescaped(double ?? single ?? '');
  }
  return attributes;
}

const ENTITIES: Readonly<Record<string, string>> = { amp: '&', lt: '<', gt: '>', quot: '"', apos: "'" };

function unescaped(text: string): string {
  if (!text.includes('&')) return text;
  return text.replace(
    /&(?:#(\d{1,7})|#x([\da-fA-F]{1,6})|(\w{2,4}));/g,
    (whole, decimal?: string, hex?: string, name?: string) => {
      if (name !== undefined) return ENTITIES[name] ?? whole;
      const code = decimal !== undefined ? Number(decimal) : parseInt(hex ?? '', 16);
      return code <= 0x10ffff ? String.fromCodePoint(code) : whole;
    },
  );
}
