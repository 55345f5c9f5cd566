import type { Restriction } from '#lib/core/design/lay-out-plan.ts';
import type { planIssued as en } from '../en/plan-issued.ts';

export const planIssued: typeof en = {
  issue: {
    heading: 'Den Plan ausgeben',
    why: 'Jetzt entscheidet das Los, welche Behandlung welche Stelle bekommt, in welcher Reihenfolge und auf welchem Platz; Codes werden vergeben. Von da an ist eine Änderung ein Nachtrag mit Begründung.',
    ready: 'Alles ist gesagt. Der Plan kann ausgegeben werden.',
    notReady: (n: number) => (n === 1 ? 'Eines ist noch zu klären:' : `${n} Dinge sind noch zu klären:`),
    noDesign: 'Einen Plan wählen.',
    formulaFaulty: 'Eine Formel lässt sich noch nicht verwenden.',
    seed: 'Startwert der Losung',
    seedHint:
      'Leer lassen, damit er gezogen wird. Derselbe Startwert gibt auf jedem Gerät dieselbe Reihenfolge; er wird aufgezeichnet.',
    seedDrawn: 'wird bei der Ausgabe gezogen',
    order: 'Reihenfolge der Sitzungen',
    orders: {
      'early-stop': 'gelost unter Reihenfolgen, die ein frühes Ende vertragen',
      chance: 'allein gelost'
    },
    spares: 'Ersatzproben je Behandlung',
    sparesHint: 'Auch sie bekommen einen Code, für eine Wiederholung nach einem verdorbenen Lauf.',
    who: 'Ihr Name',
    whoHint: 'Steht neben dem Plan in der Aufzeichnung.',
    act: 'Plan ausgeben',
    busy: 'Reihenfolge wird gelost …',
    readOnly: 'Ein anderer Tab dieses Geräts schreibt in dieser Kampagne. Dort ausgeben oder hier übernehmen.',
    takeOver: 'Hier übernehmen',
    failed:
      'Der Plan wurde nicht ausgegeben: er ließ sich nicht ablegen. Nichts ist verloren; auf dem Gerät Platz schaffen und noch einmal versuchen.',
    contradicts:
      'Der Plan wurde nicht ausgegeben: die geloste Reihenfolge passte nicht auf die Maschine. Einen anderen Plan wählen oder dies melden.'
  },
  issued: {
    by: (who: string, when: string) => `Ausgegeben${who ? ` von ${who}` : ''} am ${when}`,
    heading: 'Der Plan, wie er steht',
    print: 'Drucken',
    sheets: 'Ladeblätter',
    labels: 'Etiketten',
    plan: 'Der Plan',
    bench: 'Zum Prüfstand',
    order: 'Reihenfolge',
    state: 'Stand',
    session: 'Sitzung',
    shift: 'Schicht',
    machine: 'Maschine',
    slot: (name: string) => `Platz ${name}`,
    outOfService: 'außer Betrieb',
    empty: 'bleibt leer',
    status: {
      waiting: 'wartet',
      loading: 'wird geladen',
      running: 'läuft',
      reading: 'wird abgelesen',
      closed: 'abgeschlossen',
      dropped: 'ausgelassen'
    },
    repeats: (n: number) => `wiederholt Sitzung ${n}`,
    spares: 'Ersatzproben',
    names: 'Namen der Behandlungen zeigen',
    draw: 'Wie gelost wurde',
    seed: 'Startwert',
    generator: 'Generator',
    rules: 'Regeln',
    version: (name: string, n: number) => `${name}, Fassung ${n}`,
    construction: 'Versuchsplan',
    slotsTitle: 'Wie oft jede Behandlung auf jeden Platz kommt',
    restriction: (restriction: Restriction): string => {
      switch (restriction.tag) {
        case 'early-stop':
          return `Unter den gelosten Reihenfolgen wurde eine bevorzugt, deren erste Sitzungen früh alle Behandlungen verbinden (nach ${restriction.connectedAfter}). Das schränkt die Randomisierung ein.`;
        case 'shift-groups':
          return 'Sitzungen einer Schicht bleiben beisammen; gelost wurden die Schichten und die Sitzungen darin.';
        case 'label-classes':
          return `Behandlungen, die nicht gleich sind (Kontrolle, wenige Proben, getrennt zu halten), tauschten ihre Stellen nicht mit anderen: ${restriction.classes} Klassen.`;
        case 'slots-balanced':
          return 'Plätze wurden unter Belegungen gelost, in denen jede Behandlung so gleich oft wie möglich auf jeden Platz kommt.';
      }
    }
  },
  amend: {
    heading: 'Den ausgegebenen Plan ändern',
    why: 'Was ausgegeben wurde, bleibt aufgezeichnet. Eine Änderung kommt dazu, mit Begründung und Namen.',
    none: 'Bisher keine Änderung.',
    kinds: {
      'slot-service': 'Ein Platz fällt aus oder kommt zurück',
      'drop-session': 'Eine Sitzung wird ausgelassen',
      'add-session': 'Eine Sitzung wird wiederholt',
      'replace-plan': 'Grenzen, Vorsicht, Worte'
    },
    what: 'Was sich ändert',
    which: 'Welche Sitzung',
    again: 'Welche Sitzung noch einmal läuft',
    machine: 'Maschine',
    slot: 'Platz',
    now: 'Von jetzt an ist er',
    inService: 'in Betrieb',
    outOfService: 'außer Betrieb',
    reason: 'Begründung',
    reasonNeeded: 'Eine Änderung braucht ihre Begründung.',
    spare: 'Mit Ersatzproben, wo es welche gibt',
    noSpares: 'Wo keine Ersatzprobe da ist, wird ein neuer Code gezogen.',
    edit: 'Grenzen, Vorsicht und Worte ändern …',
    editing:
      'Der ausgegebene Plan wird geändert. Behandlungen, Plätze und Formeln stehen fest; das Übrige lässt sich berichtigen.',
    stop: 'Lassen, wie es war',
    act: 'Änderung aufzeichnen',
    nothing: 'Noch ist nichts geändert.',
    done: 'Aufgezeichnet.',
    failed: 'Die Änderung wurde nicht aufgezeichnet: sie ließ sich nicht ablegen. Noch einmal versuchen.',
    said: {
      'add-session': (n: number, of: number | null) =>
        of === null ? `Sitzung ${n} kam dazu` : `Sitzung ${n} kam dazu; sie wiederholt Sitzung ${of}`,
      'drop-session': (n: number) => `Sitzung ${n} ausgelassen`,
      'slot-service': (slot: string, back: boolean) => `Platz ${slot} ${back ? 'wieder in Betrieb' : 'außer Betrieb'}`,
      'replace-plan': () => 'Grenzen, Vorsicht oder Worte geändert'
    }
  }
};
