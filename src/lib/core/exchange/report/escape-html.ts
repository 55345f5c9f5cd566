const named: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };

/** Text as it may stand in an HTML element or quoted attribute; control characters that HTML forbids are dropped. */
export const escapeHtml = (text: string): string =>
  text
    .replace(/[^\t\n\r\x20-\x7e\xa0-\ud7ff\ue000-\ufdcf\ufdf0-\ufffd\u{10000}-\u{1fffd}]/gu, '')
    .replace(/[&<>"']/g, (c) => named[c] ?? c);
