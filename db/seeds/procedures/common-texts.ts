import type { LocalizedText } from '@shared/procedures/procedure-content';

/** A text in both languages. */
export const both = (en: string, es: string): LocalizedText => ({ en, es });

/** Common practice, not a standard: whoever sets the system up replaces it by the maker's value. */
export const startingValue = both(
  'Starting value from common practice; the maker’s manual decides.',
  'Valor inicial de práctica común; el manual del fabricante decide.',
);

export const hotOil = both(
  'Filtering oil is 330–375 °F and burns deeply on contact. Gloves to the elbow, apron and face shield on, floor dry, nobody else within reach. Never carry or pour hot oil by hand.',
  'El aceite al filtrar está a 165–190 °C (330–375 °F) y causa quemaduras profundas al contacto. Use guantes hasta el codo, delantal y careta; piso seco y nadie al alcance. Nunca cargue ni vierta aceite caliente a mano.',
);

/** 29 CFR 570.34 for under-16s (from memory); eighteen is what many employers ask. */
export const adultsOnly = both(
  'Not for anyone under 18. US federal rules restrict fryer cleaning and oil filtering for workers under 16, and many states and employers go further: the stricter rule holds.',
  'No es tarea para menores de 18 años. Las normas federales de EE. UU. restringen limpiar freidoras y filtrar aceite a menores de 16, y muchos estados y empleadores exigen más: rige la norma más estricta.',
);

/** 29 CFR 1910.147(a)(2)(iii)(A) for cord-and-plug machines, quoted second-hand. */
export const lockedOut = both(
  'Take the power away before you open or reach in: unplug and keep the plug under your own control, or lock out and tag a hard-wired motor, then prove it dead with a tester. Local codes and licensed practice decide who may do this. The plug does not cool the oil.',
  'Corte la energía antes de abrir o meter la mano: desenchufe y mantenga el enchufe bajo su propio control, o bloquee y etiquete el motor de conexión fija, y compruebe con un probador que no hay tensión. Los códigos locales y la práctica autorizada deciden quién puede hacerlo. Desenchufar no enfría el aceite.',
);

export const liveWork = both(
  'This step measures a live circuit. Only a person qualified for it under local codes does it, with meter and leads rated for the circuit. If you are not that person, stop and call someone licensed.',
  'Este paso mide un circuito energizado. Solo lo hace una persona calificada según los códigos locales, con medidor y puntas adecuados al circuito. Si no es su caso, deténgase y llame a alguien con licencia.',
);

export const keepDry = both(
  'Keep water and cleaner out of pump, lines and filter pan: water turns to steam in hot oil and rusts the pump.',
  'No deje entrar agua ni limpiador en la bomba, las líneas o la bandeja del filtro: el agua se vuelve vapor en el aceite caliente y oxida la bomba.',
);
