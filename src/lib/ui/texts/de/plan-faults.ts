import type { DraftFault } from '#lib/core/campaign/draft/draft-fault.ts';
import type { FormulaTrouble, planFaults as en } from '../en/plan-faults.ts';

const list = (items: unknown) => (Array.isArray(items) ? items.join(', ') : '');
const unit = (text: unknown) => (text === '' ? 'eine reine Zahl' : `in ${String(text)}`);

export const planFaults: typeof en = {
  fault: (fault: DraftFault): string => {
    switch (fault.tag) {
      case 'title-empty':
        return 'Die Kampagne braucht einen Titel.';
      case 'treatments-too-few':
        return `Ein Vergleich braucht mindestens ${fault.least} Behandlungen. Tippen oder einfügen.`;
      case 'treatments-too-many':
        return `Pläne gehen bis ${fault.most} Behandlungen. Den Vergleich teilen.`;
      case 'name-empty':
        return 'Hier fehlt ein Name.';
      case 'name-twice':
        return `„${fault.name}“ steht zweimal da. Zwei Namen müssen verschieden sein, sonst geraten ihre Ergebnisse durcheinander.`;
      case 'too-long':
        return `Zu lang: höchstens ${fault.most} Zeichen.`;
      case 'not-a-number':
        return `„${fault.text}“ ist keine Zahl.`;
      case 'two-meanings':
        return fault.candidates.length > 1
          ? `„${fault.text}“ kann ${fault.candidates.join(' oder ')} heißen. So schreiben, dass nur eines möglich ist (1,2340 oder 1234).`
          : `„${fault.text}“ ist nicht fertig.`;
      case 'not-whole':
        return `Hier muss eine ganze Zahl von ${fault.least} bis ${fault.most} stehen.`;
      case 'not-positive':
        return 'Das muss mehr als nichts sein.';
      case 'needed':
        return 'Das wird gebraucht.';
      case 'range-upside-down':
        return 'Die untere Grenze liegt über der oberen.';
      case 'expected-beyond-possible':
        return '„Noch einmal hinsehen“ reicht über „Kann nicht sein“ hinaus. Das eine enger oder das andere weiter machen.';
      case 'no-slot-in-service':
        return 'Kein Platz ist in Betrieb. Mindestens einer wird gebraucht.';
      case 'id-not-a-name':
        return `„${fault.text}“ taugt nicht für eine Formel: mit einem Buchstaben (a–z) beginnen, dann nur Buchstaben, Ziffern und _.`;
      case 'id-twice':
        return `„${fault.id}“ steht zweimal da. Jeder Name in der Formel steht für eines.`;
      case 'formula-empty':
        return 'Die Formel schreiben, zum Beispiel before - after.';
      case 'no-measurand':
        return 'Sagen, was gemessen wird.';
      case 'alpha-out-of-range':
        return 'α liegt zwischen 0 und 0,5; üblich ist 0,05.';
      case 'control-needed':
        return 'Eine Behandlung als Kontrolle bezeichnen oder einen anderen Vergleich wählen.';
      case 'fewer-specimens-than-two':
        return 'Mit weniger als zwei Proben lässt sich diese Behandlung kaum vergleichen.';
      case 'complete-sessions':
        return `Die Maschine hat ${fault.slots} Plätze für ${fault.treatments} Behandlungen: jede Sitzung kann alle halten (vollständige Sitzungen). Das ist erlaubt und der einfachste Plan.`;
    }
  },
  formula: (trouble: FormulaTrouble): string => {
    const { tag } = trouble;
    const say = (key: string) => String(trouble[key]);
    switch (tag) {
      case 'formula-empty':
        return 'Die Formel schreiben, zum Beispiel before - after.';
      case 'formula-too-long':
        return `Die Formel ist zu lang: höchstens ${say('most')} Zeichen.`;
      case 'formula-too-deep':
        return 'Die Formel hat zu viele Klammern ineinander.';
      case 'formula-syntax':
        return `${
          trouble.at === null
            ? 'Die Formel ergibt keinen Sinn.'
            : `Die Formel ergibt ab Zeichen ${say('at')} keinen Sinn.`
        }${trouble.comma === true ? ' In einer Formel ist das Dezimalzeichen ein Punkt: 0.5, nicht 0,5.' : ''}`;
      case 'formula-forbidden':
        return `„${say('what')}“ ist in einer Formel nicht erlaubt. Erlaubt sind Namen, Zahlen, + − * / ^, Klammern und die genannten Funktionen.`;
      case 'formula-implicit-product':
        return `Zwischen „${say('left')}“ und „${say('right')}“ fehlt das Zeichen. Für mal * schreiben.`;
      case 'formula-unknown-name':
        return `„${say('name')}“ ist weder Ablesung noch Konstante. ${
          list(trouble.known) === '' ? 'Unten hinzufügen.' : `Bekannt sind: ${list(trouble.known)}.`
        }`;
      case 'formula-unknown-function':
        return `„${say('name')}“ ist hier keine Funktion. Bekannt sind: ${list(trouble.known)}.`;
      case 'formula-ambiguous-log':
        return '„log“ kann zweierlei heißen. ln für den natürlichen, log10 für den dekadischen Logarithmus schreiben.';
      case 'formula-argument-count':
        return `${say('name')} nimmt ${say('least')}${trouble.most === null ? ' oder mehr' : ''} Wert${
          trouble.least === 1 && trouble.most === 1 ? '' : 'e'
        }, nicht ${say('actual')}.`;
      case 'formula-reserved-name':
        return `„${say('name')}“ hat in Formeln eine eigene Bedeutung. Die Ablesung oder Konstante anders nennen.`;
      case 'formula-duplicate-name':
        return `„${say('name')}“ steht für zweierlei. Eines umbenennen.`;
      case 'formula-missing-reading':
        return `Es gibt keine Ablesung „${say('name')}“, von der sie käme.`;
      case 'unit-not-understood':
        return `Die Einheit „${say('unit')}“${trouble.of === '' ? '' : ` von ${say('of')}`} ergibt keinen Sinn. So schreiben: g/cm³, m^2 oder N/mm².`;
      case 'units-differ':
        return `${say('left')} ist ${unit(trouble.leftUnit)}, ${say('right')} ist ${unit(trouble.rightUnit)}: das lässt sich nicht ${
          { add: 'addieren', subtract: 'subtrahieren', compare: 'vergleichen' }[say('how')] ?? 'verbinden'
        }, denn es sind verschiedene Größenarten.`;
      case 'unit-in-exponent':
        return `${say('text')} ist ${unit(trouble.unit)}: ein Exponent muss eine reine Zahl sein.`;
      case 'unit-to-unknown-power':
        return `${say('text')} ist ${unit(trouble.unit)} und wird mit ${say('power')} potenziert, das von Lauf zu Lauf wechselt: das Ergebnis hätte keine Einheit.`;
      case 'unit-in-function':
        return `${say('name')} nimmt eine reine Zahl, aber ${say('text')} ist ${unit(trouble.unit)}.`;
      case 'unit-of-result':
        return `Die Formel ergibt ${trouble.found === '' ? 'eine reine Zahl' : say('found')}, aber die Einheit oben ist ${
          trouble.wanted === '' ? 'leer' : say('wanted')
        }: das sind verschiedene Größenarten.`;
      case 'value-missing':
        return `${say('name')} hat noch keinen Wert.`;
      case 'division-by-zero':
        return `${say('text')} ist null, und durch null lässt sich nicht teilen.`;
      case 'not-real':
        return `${say('text')} hat für diese Zahlen keinen Wert.`;
      case 'not-finite':
        return `${say('text')} ist zu groß für eine Zahl.`;
      default:
        return 'Die Formel lässt sich nicht verwenden.';
    }
  }
};
