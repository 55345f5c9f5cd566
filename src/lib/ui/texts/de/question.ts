import type { question as en } from '../en/question.ts';

export const question: typeof en = {
  title: 'Eine eigene Frage',
  label: 'Gewichtete Summe von Varianten',
  hint: (example) =>
    `Zum Beispiel: ${example}. Namen wie in der Tabelle; + − · / ( ) und Zahlen; die Gewichte müssen zusammen null ergeben.`,
  ask: 'Rechnen',
  computing: 'Es wird gerechnet …',
  care: 'Eine Frage, die erst nach dem Blick auf die Mittelwerte gewählt wird, ist erkundend: p und Intervall gelten für eine Frage, die vor den Daten feststand. Sie kann auf die nächste Kampagne weisen, beweist hier aber nichts. Wie viele Fragen gestellt werden, ist nicht berücksichtigt.',
  caption: 'Eigene Fragen, die letzte zuerst',
  question: 'Frage',
  readAs: (sum) => `gelesen als ${sum}`,
  estimate: 'Schätzwert',
  df: 'FG',
  t: 't',
  differs: 'von null verschieden',
  same: 'nicht von null zu unterscheiden',
  failed: 'Die Rechnung brach ab. Nichts wurde geändert; bitte noch einmal fragen.',
  said: (text, estimate, lower, upper) => `${text}: ${estimate}, Intervall ${lower} bis ${upper}`,
  fault(fault, names, write) {
    switch (fault.tag) {
      case 'empty':
        return 'Zuerst eine Frage eingeben.';
      case 'too-long':
        return `Die Frage ist zu lang; höchstens ${fault.limit} Zeichen.`;
      case 'unknown-name':
        return `„${fault.found}“ ist nicht der Name einer Variante. Die Namen sind: ${names.slice(0, 6).join(', ')}${names.length > 6 ? ' …' : ''}.`;
      case 'unexpected':
        return `„${fault.found}“ kann an Stelle ${fault.at + 1} nicht stehen.`;
      case 'ended-early':
        return 'Die Frage hört mittendrin auf: Es muss eine Variante oder eine Zahl folgen.';
      case 'unclosed':
        return `Die Klammer an Stelle ${fault.at + 1} ist nicht geschlossen.`;
      case 'product-of-treatments':
        return `An Stelle ${fault.at + 1} werden zwei Varianten multipliziert. Varianten nur mit Zahlen multiplizieren.`;
      case 'division-by-treatments':
        return `An Stelle ${fault.at + 1} wird durch eine Variante geteilt. Nur durch Zahlen teilen.`;
      case 'division-by-zero':
        return `An Stelle ${fault.at + 1} wird durch null geteilt.`;
      case 'number-without-treatment':
        return `Die Zahl ${write(fault.constant)} gehört zu keiner Variante. Zahlen dienen nur als Gewichte von Varianten.`;
      case 'weights-do-not-cancel':
        return `Die Gewichte ergeben zusammen ${write(fault.sum)} statt null: Was abgezogen wird, muss so viel wiegen wie das, wovon es abgezogen wird.`;
      case 'nothing-left':
        return 'Alle Varianten heben sich auf, es wird nichts verglichen.';
    }
  }
};
