const formula = /^[\d½]*(?:\[\d+\])?(?:[A-Z][a-z]?\d*|\*|\((?:[A-Z][a-z]?\d*)+\)\d*)+(?:_\w+)?(?:\((?:g|a|s|l|ads)\))?$/;

/** A text of a drawing in which the formulas have true indices: NH3* + 2* as NH₃* + 2*. */
export function FormulaTspans({ text }: { text: string }) {
  return text.split(/(?<=\s)|(?=…)/).flatMap((word, at) => {
    const bare = word.trim();
    if (!/\d/.test(bare) || !formula.test(bare) || /^TS\d/.test(bare)) return [<tspan key={at}>{word}</tspan>];
    return word.split(/(?<=[A-Za-z)])(\d+)/).flatMap((part, index) => (index % 2 === 1
      ? [<tspan key={`${at} ${index}`} dy="3" fontSize="0.78em">{part}</tspan>, <tspan key={`${at} ${index} up`} dy="-3">{'\u200b'}</tspan>]
      : [<tspan key={`${at} ${index}`}>{part}</tspan>]));
  });
}
