import type { reasons as en } from '../en/reasons.ts';

const list = (rows: readonly number[]): string => rows.map((row) => row + 1).join(', ');
const factor: Record<string, string> = {
  slot: 'der Platz',
  machine: 'die Maschine',
  shift: 'die Schicht',
  session: 'die Belegung',
  treatment: 'die Variante',
  covariate: 'die Probeneigenschaft'
};
const named = (key: string): string => factor[key] ?? key;
const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

export const reasons: typeof en = {
  reason(reason, names) {
    switch (reason.tag) {
      case 'not-asked':
        return 'Im Plan nicht verlangt.';
      case 'no-kept-readings':
        return 'Noch zählt kein Messwert. Die erste Belegung aufzeichnen oder einen verworfenen Lauf wieder gelten lassen.';
      case 'one-treatment':
        return `Nur ${names[reason.treatment] ?? 'eine Variante'} hat Messwerte. Für einen Vergleich braucht es eine zweite Variante.`;
      case 'one-session':
        return 'Nur eine Belegung hat Messwerte, so lassen sich Belegungen nicht vom Zufall trennen. Eine zweite Belegung aufzeichnen.';
      case 'no-shared-session':
        return 'Keine Belegung enthält zwei Varianten mit Messwert, innerhalb einer Belegung lässt sich also nichts vergleichen.';
      case 'no-error-degrees-of-freedom':
        return `${reason.runs} Messwerte für ${reason.parameters} zu schätzende Größen lassen nichts übrig, um den Zufall zu beurteilen. Mittelwerte gibt es, Fehler nicht: weitere Belegungen aufzeichnen.`;
      case 'no-scatter':
        return 'Die Messwerte streuen innerhalb der Belegungen gar nicht. Nachsehen, ob das Messgerät hing oder Werte abgeschrieben wurden.';
      case 'disconnected':
        return `Die Belegungen zerfallen in ${reason.parts} Gruppen ohne gemeinsame Variante. Unter „Reparatur“ steht die Belegung, die sie verbindet.`;
      case 'no-control':
        return 'Keine Variante ist als Kontrolle gekennzeichnet. Im Plan kennzeichnen (Nachtrag mit Begründung).';
      case 'control-without-readings':
        return 'Die Kontrolle hat keinen zählenden Messwert. Eine Belegung mit der Kontrolle aufzeichnen.';
      case 'no-margin':
        return 'Der Plan nennt keine Grenze, innerhalb der eine Variante als gleichwertig gilt. Im Plan festlegen, bevor man das Ergebnis ansieht.';
      case 'no-ruined-runs':
        return 'Kein Lauf ist verworfen.';
      case 'no-ruined-readings':
        return 'Die verworfenen Läufe haben keine Messwerte, es lässt sich also nichts einsetzen.';
      case 'no-limits':
        return 'Kein Messwert endete an einer Grenze.';
      case 'no-slots':
        return 'Die Plätze wurden nicht aufgezeichnet.';
      case 'one-level':
        return `${capital(named(reason.factor))} war bei allen Messwerten gleich und kann daher nichts ausmachen.`;
      case 'confounded':
        return `${capital(named(reason.factor))} lässt sich nicht trennen von: ${named(reason.with)}. Beide wechselten immer zusammen.`;
      case 'covariate-missing':
        return `Die gemessene Probeneigenschaft fehlt in Zeile ${list(reason.rows)}. Eintragen oder die Eigenschaft weglassen.`;
      case 'level-missing':
        return `Für Zeile ${list(reason.rows)} fehlt die Angabe: ${reason.factor}. Eintragen oder aus dem Modell nehmen.`;
      case 'not-balanced':
        return 'Die zählenden Läufe sind nicht ausgewogen; dieses Verfahren verlangt das. Das Verfahren für unausgewogene Läufe steht daneben.';
      case 'not-complete':
        return 'Nicht jede Belegung enthält jede Variante; dieses Verfahren verlangt das.';
      case 'repeated-in-session':
        return 'Eine Variante steht zweimal in einer Belegung; dieses Verfahren lässt das nicht zu.';
      case 'not-positive':
        return `Potenzen und Logarithmen brauchen Werte über null; Zeile ${list(reason.rows)} erfüllt das nicht.`;
      case 'narrow-range':
        return 'Die Messwerte liegen zu eng beisammen, als dass die Skala etwas ausmachte.';
      case 'too-few-readings':
        return `${reason.have} Messwerte sind zu wenige; ${reason.need} sind nötig.`;
      case 'did-not-converge':
        return `Die Rechnung kam in ${reason.iterations} Schritten nicht zur Ruhe. Die Auswertung mit festen Belegungen ist nicht betroffen.`;
      case 'no-maximum':
        return `Alle Messwerte von ${reason.treatments.map((i) => names[i] ?? i + 1).join(', ')} endeten an der Grenze: für den Mittelwert gibt es keine Schätzung, nur eine Schranke.`;
      case 'too-large':
        return `Wegen der Größe weggelassen: ${reason.have}; dieses Gerät rechnet höchstens ${reason.limit} auf einmal.`;
    }
  },
  fault(fault) {
    switch (fault.tag) {
      case 'no-treatments':
        return 'Es gibt keine Varianten. Einen Plan herausgeben oder eine Datei mit Messwerten einlesen.';
      case 'no-sessions':
        return 'Es gibt keine Belegungen. Einen Plan herausgeben oder eine Datei mit Messwerten einlesen.';
      case 'no-readings':
        return 'Es gibt noch keine Messwerte. Sie erscheinen hier, sobald der Prüfstand sie aufzeichnet oder eine Datei eingelesen wird.';
      case 'not-a-number':
        return `Zeile ${fault.row + 1} enthält „${fault.found}“, wo eine Zahl stehen muss. Den Messwert berichtigen; sonst ist nichts betroffen.`;
      case 'unknown-treatment':
        return `Zeile ${fault.row + 1} nennt eine Variante, die der Plan nicht kennt.`;
      case 'unknown-session':
        return `Zeile ${fault.row + 1} nennt eine Belegung, die der Plan nicht kennt.`;
      case 'unknown-control':
        return 'Die Kontrolle gehört nicht zu den Varianten. Den Plan nachtragen.';
      case 'bad-alpha':
        return `Die Irrtumswahrscheinlichkeit ${fault.alpha} muss zwischen 0 und 0,5 liegen. Den Plan nachtragen.`;
      case 'bad-margin':
        return `Die Grenze der Gleichwertigkeit ${fault.margin} muss über null liegen. Den Plan nachtragen.`;
      case 'bad-target':
        return 'Der Zielwert ist keine Zahl. Den Plan nachtragen.';
      case 'bad-contrast':
        return `Die Frage „${fault.name}“ hat ${fault.have} Gewichte statt ${fault.need}, oder sie ergeben zusammen nicht null.`;
      case 'bad-seed':
        return 'Der Startwert der Simulationen ist keine ganze Zahl.';
    }
  }
};
