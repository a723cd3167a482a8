/** A colour in sRGB: channels 0 to 255, opacity 0 to 1. */
export interface Colour {
  readonly red: number;
  readonly green: number;
  readonly blue: number;
  readonly alpha: number;
}

/** Reads `#rrggbb` or `rgb(r g b / a%)`. */
export function parseColour(text: string): Colour {
  const hex = /^#([0-9a-f]{2})([0-9a-f]{2})([0-9a-f]{2})$/.exec(text);
  if (hex) {
    const [red, green, blue] = hex.slice(1).map((pair) => Number.parseInt(pair, 16)) as [number, number, number];
    return { red, green, blue, alpha: 1 };
  }
  const rgb = /^rgb\((\d+) (\d+) (\d+) \/ (\d+)%\)$/.exec(text);
  if (!rgb) throw new Error(`Not a colour: ${text}`);
  const [red, green, blue, percent] = rgb.slice(1).map(Number) as [number, number, number, number];
  return { red, green, blue, alpha: percent / 100 };
}

/** What is seen where a clear colour lies over an opaque one. */
export function over(top: Colour, under: Colour): Colour {
  const mix = (a: number, b: number): number => a * top.alpha + b * (1 - top.alpha);
  return {
    red: mix(top.red, under.red),
    green: mix(top.green, under.green),
    blue: mix(top.blue, under.blue),
    alpha: 1,
  };
}

/** Relative luminance, WCAG 2.2. */
function luminance({ red, green, blue }: Colour): number {
  const linear = (channel: number): number => {
    const c = channel / 255;
    return c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4;
  };
  return 0.2126 * linear(red) + 0.7152 * linear(green) + 0.0722 * linear(blue);
}

/** Contrast of two opaque colours, 1 to 21, WCAG 2.2. */
export function contrastRatio(a: Colour, b: Colour): number {
  const [dark, light] = [luminance(a), luminance(b)].sort((x, y) => x - y) as [number, number];
  return (light + 0.05) / (dark + 0.05);
}
