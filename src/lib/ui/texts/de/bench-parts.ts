import type { benchParts as en } from '../en/bench-parts.ts';

/** Ein kurzer Name ist nur eine Nummer; ein langer sagt selbst, was er ist. */
const platz = (name: string) => (name.length <= 3 ? `Platz ${name}` : name);

export const benchParts: typeof en = {
  entry: {
    label: (label, slot, code) => `${label}, ${platz(slot)}, Probe ${code}`,
    understood: (value) => `Verstanden: ${value}`,
    empty: 'Messwert tippen, dann Eingabe.',
    system: 'Tastatur des Geräts',
    own: 'Tastenfeld des Programms',
    missing: 'Kein Messwert …',
    repeats: (done, of, mean, scatter) =>
      scatter === null ? `${done} von ${of}, Mittel ${mean}` : `${done} von ${of}, Mittel ${mean}, Streuung ${scatter}`
  },
  problem: {
    empty: 'Es wurde nichts getippt.',
    notANumber: (at) => `„${at}“ gehört zu keiner Zahl. Nichts wurde aufgezeichnet.`,
    ambiguous: 'Das kann man auf zwei Arten lesen. Welche ist gemeint?',
    unfinished: 'Die Zahl endet mit ihrem Komma. Ist das so gemeint?',
    otherUnit: (typed, unit) =>
      `„${typed}“ ist nicht die Einheit dieser Messung. Den Wert ${unit === '' ? 'als bloße Zahl' : `in ${unit}`} eingeben.`,
    limitNotAllowed: 'Diese Messung endet an keiner Grenze. Die Zahl selbst eingeben.',
    tooManyDigits: 'Mehr Ziffern, als das Programm genau behalten kann. Höchstens 15 eingeben.',
    tooLargeOrSmall: 'Diese Zahl ist größer oder kleiner, als das Programm behalten kann.'
  },
  warning: {
    title: 'Noch einmal ansehen',
    meant: (value) => `Gemeint war ${value}`,
    keepTitle: 'Oder behalten, weil …',
    reasons: ['Noch einmal abgelesen: es ist so', 'Die Probe sieht anders aus', 'Bekannte Störung am Messgerät'],
    own: 'Mit eigenen Worten',
    keep: (value) => `${value} behalten`
  },
  load: {
    code: 'Code der Probe in der Hand scannen oder tippen',
    hint: 'Ein Handscanner tippt von selbst. Eingabe allein bestätigt die geplante Probe.',
    scan: 'Mit der Kamera scannen',
    type: 'Code tippen',
    reallyTitle: (code, slot) => `Oder ${code} ist wirklich in ${platz(slot)}, weil …`,
    other: 'Eine andere Probe ist im Platz …',
    otherSlot: (code, slot, here) => `${code} gehört in ${platz(slot)}. Gerade wird ${platz(here)} belegt.`,
    putThere: (slot) => `Sie kommt jetzt in ${platz(slot)}`,
    otherSession: (code, number, slot) => `${code} gehört in Belegung ${number}, ${platz(slot)}. Bis dahin weglegen.`,
    used: (code, number, slot) =>
      `${code} wurde schon geprüft: Belegung ${number}, ${platz(slot)}. Eine Probe zählt einmal.`,
    usedWayOut: (planned) =>
      `${planned} nehmen, oder eine Ersatzprobe derselben Art. Ist dort falsch aufgezeichnet, jene Belegung wieder öffnen und das Einlegen zurücknehmen.`,
    usedHere: (code, slot) => `${code} ist in ${platz(slot)} dieser Belegung aufgezeichnet.`,
    moveHere: (slot) => `Sie ist wirklich in ${platz(slot)}: Aufzeichnung umsetzen`,
    spare: (code) => `${code} ist eine Ersatzprobe dessen, was hier geplant ist.`,
    spareOther: (code) => `${code} ist eine Ersatzprobe anderer Art, als hier geplant ist.`,
    misread: (code) => `${code} ist kein Code dieses Labors: das Prüfzeichen stimmt nicht.`,
    misreadWayOut: 'Das Etikett noch einmal lesen oder scannen.',
    unknown: (code) => `${code} ist ein richtiger Code, aber keiner Probe dieser Kampagne.`,
    really: (code, slot) => `${code} ist wirklich in ${platz(slot)}`,
    reasons: ['Die geplante Probe ist beschädigt', 'So eingelegt vorgefunden', 'Vom Ingenieur so angeordnet'],
    treatmentChanges: 'Die Auswertung zählt, was wirklich eingelegt ist.'
  },
  scan: {
    title: 'Etikett scannen',
    hint: 'Den quadratischen Code des Etiketts in den Rahmen halten.',
    starting: 'Kamera wird gestartet …',
    denied:
      'Die Kamera darf nicht benutzt werden. In den Einstellungen des Browsers für diese Seite erlauben, oder den Code tippen.',
    none: 'Dieses Gerät hat keine Kamera, die der Browser benutzen darf. Den Code tippen.',
    failed: 'Kamera oder Entschlüsselung ließen sich nicht starten. Den Code tippen; sonst ist nichts betroffen.',
    close: 'Kamera schließen'
  },
  prepare: {
    precautions: 'Vorsichtsmaßnahmen',
    none: 'Für diese Kampagne wurden keine Vorsichtsmaßnahmen notiert. Maschine anhalten und vom Netz trennen, Schutz im Lauf geschlossen halten, tragen, was das Labor vorschreibt.',
    precedence: 'Anweisungen des Labors, Handbuch der Maschine und örtliche Vorschriften gehen vor.',
    conditions: 'Bedingungen dieser Belegung',
    suggested: 'wie zuletzt, zu bestätigen',
    window: (range) => `Fenster ${range}`,
    because: 'Außerhalb des Fensters. Weiter, weil …',
    needed: 'Jede Bedingung angeben, oder leer lassen und in einer Notiz sagen, warum.'
  },
  run: {
    ready: 'bereit zum Start',
    elapsed: 'läuft seit',
    left: 'noch zu laufen',
    over: 'überzogen um',
    began: (time) => `gestartet um ${time}`,
    due: (length) => `geplante Dauer ${length}`,
    awake: 'Der Bildschirm bleibt an.',
    notAwake: 'Dieser Browser kann den Bildschirm nicht anlassen. Die Uhr geht trotzdem weiter.',
    earlyTitle: 'Vor dem geplanten Ende anhalten',
    earlyReasons: ['Maschine blieb von selbst stehen', 'Probe hat versagt', 'Aus Sicherheit angehalten'],
    early: 'Jetzt anhalten'
  },
  check: {
    title: 'Messungen dieser Belegung',
    specimen: 'Probe',
    flagged: 'nach Warnung behalten',
    missingLead: (n) =>
      n === 1
        ? 'Eine Messung fehlt. Eingeben oder sagen, warum.'
        : `${n} Messungen fehlen. Eingeben oder sagen, warum.`,
    enterNow: 'Jetzt eingeben',
    sayMissing: 'Gibt es nicht …',
    none: 'Nichts war auffällig.',
    correct: 'Berichtigen',
    mean: 'Mittel',
    measurand: 'Ergebnis',
    noResult: {
      missing: (reading) => `nicht berechnet: ${reading} fehlt.`,
      undecided:
        'nicht berechnet: Zwei Geräte sind sich über diese Messung nicht einig. In der Aufzeichnung entscheiden.',
      limits: 'nicht berechnet: Die Messwerte blieben an Grenzen stehen, die nach beiden Seiten ziehen.',
      divides: (text) => `lässt sich nicht berechnen: ${text} ist null. Die Messwerte noch einmal ansehen.`,
      notReal: (text) =>
        `lässt sich nicht berechnen: ${text} hat mit diesen Messwerten keine Lösung. Sie noch einmal ansehen.`,
      notFinite: (text) =>
        `lässt sich nicht berechnen: ${text} wächst über alle Zahlen. Die Messwerte noch einmal ansehen.`,
      formula:
        'lässt sich nicht berechnen: Die Formel des Plans ist nicht brauchbar. Die Messwerte sind sicher; bitte dem Planer sagen.',
      notLoaded: 'hier nicht berechnet. Die Messwerte sind sicher; die Ergebnisse werden am Schreibtisch berechnet.'
    }
  },
  missing: {
    title: (label, slot) => `Kein Messwert: ${label}, ${platz(slot)}`,
    reasons: ['Vor dem nächsten Schritt vergessen', 'Messgerät ausgefallen', 'Probe lässt sich nicht messen'],
    act: 'Als fehlend aufzeichnen'
  },
  ruin: {
    open: 'Verdorben …',
    title: 'Was ist verdorben?',
    whole: 'Die ganze Belegung',
    run: (slot, code) => `${platz(slot)}, ${code}`,
    why: 'Warum? Der Tipp zeichnet es auf.',
    own: 'Mit eigenen Worten',
    act: 'Als verdorben kennzeichnen',
    kept: 'Die Messungen bleiben, durchgestrichen.',
    doneRun: (slot) => `${platz(slot)} ist als verdorben gekennzeichnet.`,
    doneSession: 'Die Belegung ist als verdorben gekennzeichnet.',
    next: 'Wie weiter damit?',
    later: 'Später wiederholen',
    laterSays: 'Eine Belegung am Ende prüft noch einmal mit einer Ersatzprobe.',
    spare: 'Jetzt eine Ersatzprobe',
    spareSays: (code) => `${code} in denselben Platz einlegen.`,
    noSpare: 'Von dieser Art gibt es keine Ersatzprobe.',
    leave: 'Weglassen',
    leaveSays: 'Der Vergleich kommt ohne sie aus.',
    price: (se, percent) => `Standardfehler einer Differenz ${se} (${percent})`,
    pricing: 'der Preis wird berechnet …',
    noPrice: 'Der Preis ließ sich hier nicht berechnen; die Wahl ist frei.',
    lost: 'einige Vergleiche gehen verloren',
    reinstate: 'Doch nicht verdorben …',
    reinstateTitle: 'Warum zählt es doch?',
    reinstateAct: 'Wieder zählen',
    reinstateReasons: ['Falschen Platz gekennzeichnet', 'Noch einmal angesehen: in Ordnung']
  },
  note: {
    open: 'Notiz …',
    title: 'Notiz',
    about: 'Über',
    session: 'diese Belegung',
    shift: 'die Schicht',
    run: (slot) => `${platz(slot)}`,
    text: 'Was soll man später wissen?',
    act: 'Notiz speichern',
    count: (n) => `${n} ${n === 1 ? 'Notiz' : 'Notizen'}`
  },
  correct: {
    title: (label, slot) => `Berichtigen: ${label}, ${platz(slot)}`,
    was: (value) => `Aufgezeichnet: ${value}`,
    value: 'Richtiger Wert',
    why: 'Warum?',
    reasons: ['Vertippt', 'Noch einmal abgelesen', 'Falscher Platz'],
    act: 'Berichtigung aufzeichnen'
  },
  queue: {
    open: 'Belegungen',
    title: 'Belegungen in ihrer Reihenfolge',
    status: {
      waiting: 'wartet',
      loading: 'wird eingelegt',
      running: 'läuft',
      reading: 'wird gemessen',
      closed: 'abgeschlossen',
      dropped: 'gestrichen'
    },
    amended: 'später dazugekommen',
    go: (number) => `Zu Belegung ${number}`,
    goShort: 'Dorthin',
    reopen: 'Wieder öffnen …',
    reopenAct: 'Wieder öffnen',
    reopenReasons: ['Eine Messung war falsch', 'Eine Messung wurde vergessen']
  },
  who: {
    title: 'Wer ist am Prüfstand?',
    label: 'Name oder Kürzel, wie das Labor sie schreibt',
    open: 'Anfangen',
    hint: 'Er steht neben jedem Eintrag. Er benennt, er beweist nicht.',
    at: (name) => name,
    change: 'Übergeben'
  },
  paper: {
    open: 'Vom Papier …',
    title: 'Messungen vom Papier',
    says: 'Beide Zeiten bleiben: wann abgelesen und wann getippt wurde.',
    when: 'Abgelesen um',
    begin: 'Messungen dieser Zeit tippen',
    future: 'Diese Zeit ist noch nicht gekommen.',
    off: 'Zurück zum Messen'
  },
  settings: {
    open: 'Einstellungen',
    title: 'Dieser Prüfstand',
    keys: 'Größe der Tasten',
    keySizes: { normal: 'groß', larger: 'größer', largest: 'am größten' },
    hand: 'Tastenfeld',
    hands: { right: 'rechts', left: 'links' },
    typing: 'Tippen',
    signals: 'Ton und Vibration am Ende eines Laufs',
    gauge: 'Messgerät an einer seriellen Schnittstelle',
    gaugeOpen: 'Messgerät verbinden',
    gaugeClose: 'Trennen',
    gaugeOn: (line) => `verbunden; letzte Zeile: ${line}`,
    gaugeNone:
      'Dieser Browser kann keine seriellen Schnittstellen benutzen. Ein Messgerät, das wie eine Tastatur tippt, geht trotzdem.',
    gaugeFault: 'Die Schnittstelle ließ sich nicht öffnen oder ging verloren. Tippen geht trotzdem.',
    baud: 'Geschwindigkeit (Baud)',
    gaugeWaits: 'wartet auf die erste stabile Zeile',
    light: 'Licht'
  }
};
