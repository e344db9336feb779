// Windows of a curve, fetched from the service: samples, or lowest and highest of each bucket.

const MOST_POINTS = 4000;

export class Source {
  constructor(address) {
    this.address = address;
    this.running = null;
  }

  /** Points {x, y} between two places; null where a newer request has taken over. */
  async window(from, to, pixels, logarithmic) {
    this.running?.abort();
    const control = new AbortController();
    this.running = control;
    const points = Math.max(50, Math.min(MOST_POINTS, Math.round(pixels)));
    try {
      const parts = await Promise.all(
        spans(from, to, logarithmic).map(([a, b]) => this.fetch(a, b, points, control.signal)),
      );
      return joined(parts);
    } catch (e) {
      if (e.name === "AbortError") return null;
      throw e;
    }
  }

  async histogram() {
    const found = await this.fetch(0, 0, 2, null);
    return found.counts.map((y, k) => ({ x: found.start + (k + 0.5) * found.step, y }));
  }

  async fetch(from, to, points, signal) {
    const answer = await fetch(`${this.address}?from=${from}&to=${to}&points=${points}`, {
      signal,
      headers: { Accept: "application/json" },
    });
    if (!answer.ok) throw new Error(`series ${answer.status}`);
    return answer.json();
  }
}

/** A logarithmic axis shows each decade as wide as the next, so each is fetched by itself. */
function spans(from, to, logarithmic) {
  if (!logarithmic) return [[from, to]];
  const found = [];
  for (let a = from; a < to; ) {
    const next = Math.pow(10, Math.floor(Math.log10(a) + 1 + 1e-9));
    found.push([a, Math.min(next, to)]);
    a = next;
  }
  return found;
}

function joined(parts) {
  const points = [];
  let reached = -Infinity;
  for (const part of parts) {
    part.low.forEach((low, k) => {
      const x = part.start + k * part.step;
      if (x <= reached) return;
      reached = x;
      points.push({ x, y: low === null ? NaN : low });
      if (part.high !== null && low !== null && part.high[k] !== low) {
        points.push({ x, y: part.high[k] });
      }
    });
  }
  return points;
}
