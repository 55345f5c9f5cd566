import type { how as en } from '../en/how.ts';

type Words = { [K in keyof typeof en]: (typeof en)[K] extends string ? string : (typeof en)[K] };

export const how: Words = {
  head: 'So wurde gerechnet',
  from: 'Quelle',
  means: {
    words:
      'Jeder Mittelwert ist die Vorhersage für diese Variante in einer durchschnittlichen Belegung. Die Abweichungen der Belegungen werden mit kleinsten Quadraten herausgenommen, es zählen also nur Unterschiede innerhalb der Belegungen. Der Standardfehler gehört zu dieser Vorhersage.',
    formula: 'y = μ + τᵢ + βⱼ + ε;  C τ̂ = Q;  Mittel = μ̂ + τ̂ᵢ + Durchschnitt der β̂ⱼ',
    source:
      'Cochran & Cox (1957), Experimental Designs, Kapitel 11; Montgomery, Design and Analysis of Experiments, Abschnitt 4.4'
  },
  random: {
    words:
      'Die Abweichungen der Belegungen gelten als aus einer gemeinsamen Normalverteilung gezogen. Dann tragen auch die Unterschiede zwischen Belegungssummen etwas bei. Die beiden Varianzen werden mit eingeschränkter Maximum-Likelihood geschätzt, die Mittelwerte mit verallgemeinerten kleinsten Quadraten; Fehler und Freiheitsgrade berücksichtigen, dass die Varianzen geschätzt sind.',
    formula: 'V = σ² I + σ_b² Z Zᵀ;  m̂ = (Xᵀ V⁻¹ X)⁻¹ Xᵀ V⁻¹ y',
    source: 'Patterson & Thompson (1971), Biometrika 58, 545; Kenward & Roger (1997), Biometrics 53, 983'
  },
  plain: {
    words:
      'Der einfache Durchschnitt der Messwerte einer Variante. Er vermengt die Variante mit den Belegungen, in die sie geriet.',
    formula: 'Summe der Messwerte / Zahl der Messwerte',
    source: 'Definition'
  },
  letters: {
    words:
      'Zwei Varianten mit einem gemeinsamen Buchstaben unterscheiden sich auf dem Niveau des Plans nicht, alle Paare zusammen betrachtet. Nicht verschieden heißt nicht gleich.',
    formula: 'Paare nach Tukey–Kramer; Buchstaben durch Einfügen und Aufsaugen',
    source: 'Piepho (2004), Journal of Computational and Graphical Statistics 13, 456'
  },
  tukey: {
    words:
      'Alle Paare auf einmal: die Wahrscheinlichkeit auch nur eines falschen Unterschieds unter allen bleibt unter dem Niveau.',
    formula: '|d| / SE ≥ q(1 − α; t, FG) / √2',
    source: 'Tukey (1953); Kramer (1956), Biometrics 12, 307'
  },
  holm: {
    words:
      'Hält die Wahrscheinlichkeit auch nur eines falschen Unterschieds unter dem Niveau, ohne etwas über den Zusammenhang der Paare anzunehmen; für alle Paare etwas weniger scharf.',
    formula: 'p₍ᵢ₎ · (m − i + 1), steigend gemacht',
    source: 'Holm (1979), Scandinavian Journal of Statistics 6, 65'
  },
  unadjusted: {
    words:
      'Jedes Paar für sich. Richtig für ein Paar, das vor dem ersten Lauf benannt war; unter vielen Paaren sehen einige allein durch Zufall verschieden aus.',
    formula: '|d| / SE gegen Students t',
    source: 'Student (1908)'
  },
  dunnett: {
    words:
      'Jede Variante gegen die Kontrolle, und nur das. Die Wahrscheinlichkeit auch nur eines falschen Unterschieds zur Kontrolle bleibt unter dem Niveau.',
    formula: '|dᵢ| / SEᵢ ≥ zweiseitiges Quantil der gemeinsamen t-Verteilung',
    source: 'Dunnett (1955), Journal of the American Statistical Association 50, 1096'
  },
  hsu: {
    words:
      'Jede Variante gegen die beste der übrigen. Ein Intervall, das auf der falschen Seite der Null bleibt, schließt die Variante als beste aus.',
    formula: 'beschränkte Intervalle für μᵢ − max(j ≠ i) μⱼ',
    source: 'Hsu (1996), Multiple Comparisons, Kapitel 4'
  },
  equivalence: {
    words:
      'Zwei einseitige Tests zeigen, dass eine Variante um weniger als die Grenze des Plans von der Kontrolle abweicht. Nur so lässt sich Gleichheit zeigen; ein großer p-Wert eines Unterschieds kann das nicht.',
    formula: 'das (1 − 2α)-Intervall liegt zwischen −Grenze und +Grenze',
    source: 'Schuirmann (1987), Journal of Pharmacokinetics and Biopharmaceutics 15, 657'
  },
  contrasts: {
    words: 'Die im Plan eingegebenen Fragen: eine gewichtete Summe der bereinigten Mittelwerte.',
    formula: 'Σ wᵢ mᵢ;  SE aus derselben Kovarianz wie die Mittelwerte',
    source: 'jedes Lehrbuch linearer Modelle'
  },
  sessions: {
    words:
      'Wie weit jede Belegung über oder unter der durchschnittlichen lag, befreit von den Varianten, die sie enthielt. Mit zufälligen Belegungen werden die Abweichungen um ihre Unsicherheit zur Null gezogen.',
    formula: 'β̂ = diag(1/k)(B − Nᵀ m̂);  zufällig: beste lineare unverzerrte Vorhersage',
    source: 'Henderson (1975), Biometrics 31, 423'
  },
  workings: {
    words:
      'Der Weg des Handbuchs, mit dem Taschenrechner nachzugehen: die Summe jeder Variante abzüglich der Summen ihrer Belegungen, auf deren Läufe verteilt.',
    formula: 'ausgewogen: Qᵢ = k Tᵢ − B₍ᵢ₎ und τ̂ᵢ = Qᵢ / (λ t);  sonst: Qᵢ = Tᵢ − Σ Belegungsmittel, C τ̂ = Q',
    source: 'Montgomery, Design and Analysis of Experiments, Abschnitt 4.4; Yates (1936)'
  },
  anova: {
    words:
      'Die Quadratsumme wird in beiden Reihenfolgen zerlegt. Varianten, für Belegungen bereinigt, beantworten die Frage; Belegungen, für Varianten bereinigt, sagen, ob die Belegungen sich unterscheiden.',
    formula: 'bereinigt: Abnahme der Fehlerquadratsumme, wenn die Ursache zuletzt hinzukommt',
    source: 'Montgomery, Design and Analysis of Experiments, Tabelle 4.23 und ihr Text'
  },
  variance: {
    words: 'Wie viel der Streuung eines Messwerts von seiner Belegung kommt und wie viel vom Lauf.',
    formula: 'Anteil = σ_b² / (σ² + σ_b²);  Test auf fehlende Belegungsvarianz: halbes Chi-Quadrat auf 1',
    source: 'Self & Liang (1987), Journal of the American Statistical Association 82, 605'
  },
  efficiency: {
    words:
      'Der Anteil der Information über die Varianten, der bleibt, nachdem die Belegungen herausgenommen sind; 100 % wären Belegungen mit jeder Variante.',
    formula: 'harmonisches Mittel der von null verschiedenen Eigenwerte von R^(−1/2) C R^(−1/2)',
    source: 'John & Williams (1995), Cyclic and Computer Generated Designs, Kapitel 2'
  },
  residuals: {
    words:
      'Was von jedem Messwert bleibt, wenn Variante und Belegung herausgenommen sind, geteilt durch seinen Standardfehler aus einer Anpassung ohne ihn.',
    formula: 'eᵢ / (s₍ᵢ₎ √(1 − hᵢᵢ))',
    source: 'Cook & Weisberg (1982), Residuals and Influence in Regression, Kapitel 2'
  },
  normal: {
    words:
      'Die geordneten Residuen gegen das, was normalverteilte wären. Das Band umfasst, was simulierte normale Messwerte in genau diesem Plan ergaben.',
    formula: 'simulierte Hülle, Startwert und Zahl der Ziehungen festgehalten',
    source: 'Atkinson (1981), Biometrika 68, 13'
  },
  ruined: {
    words:
      'Die Auswertung einmal, wie sie zählt, ohne die verworfenen Läufe, und einmal mit deren Messwerten für bare Münze. Eine große Änderung sagt, dass das Urteil an der Entscheidung hängt, sie wegzulassen.',
    formula: 'Änderung = Mittel ohne − Mittel mit',
    source: 'übliche Praxis, keine Quelle'
  },
  repair: {
    words:
      'Jeder Vorschlag wird an der mittleren Varianz eines Unterschieds danach gemessen, gegen den Plan. Die zusätzliche Belegung ist die beste, die sich aus vorhandenen Proben bilden lässt.',
    formula: 'A = 2 Spur(C⁺) / (t − 1), für jeden hinzugefügten Lauf fortgeschrieben',
    source: 'John & Williams (1995), Kapitel 2; Sherman & Morrison (1950)'
  },
  ranks: {
    words:
      'Messwerte werden durch ihren Rang in der Belegung ersetzt; die Tests fragen, ob sich Rangsummen mehr unterscheiden, als der Zufall es täte.',
    formula: 'Durbin: T₂ auf t − 1 und bk − b − t + 1;  Skillings–Mack: Aᵀ Σ⁻ A',
    source:
      'Conover (1999), Practical Nonparametric Statistics, Abschnitt 5.9; Skillings & Mack (1981), Technometrics 23, 171'
  },
  scale: {
    words:
      'Die Likelihood der Messwerte auf jeder Potenzskala. Ein Wert im Intervall ist so gut wie der beste; 1 ist die abgelesene Skala, 0 der Logarithmus.',
    formula: 'y → (y^λ − 1) / (λ ẏ^(λ−1)), Profil-Likelihood von λ',
    source: 'Box & Cox (1964), Journal of the Royal Statistical Society B 26, 211'
  },
  limits: {
    words:
      'Messwerte, die an einer Grenze endeten, zählen als „mindestens“ oder „höchstens“ so viel. Mittelwerte durch Maximum-Likelihood eines normalen Modells mit Belegungen.',
    formula: 'L = Π φ((y − m)/σ)/σ · Π Φ(±(Grenze − m)/σ)',
    source: 'Tobin (1958), Econometrica 26, 24'
  }
};
