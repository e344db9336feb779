// Puts a live chart in the place of each drawn one. Without this file the drawings stand.

import { flagRoom, flags, limits } from "./plot-marks.js";
import { Source } from "./plot-series.js";
import { theme } from "./plot-theme.js";

const { Chart } = window;
const fingers = window.matchMedia("(pointer: coarse)").matches; // they scroll the page
const dark = window.matchMedia("(prefers-color-scheme: dark)");

class Plot {
  constructor(figure) {
    const data = figure.dataset;
    this.figure = figure;
    this.kind = data.plot;
    this.marks = JSON.parse(data.marks);
    this.titles = { x: data.xTitle, y: data.yTitle };
    this.whole = { from: Number(data.xFrom), to: Number(data.xTo) };
    this.height = { from: Number(data.yFrom), to: Number(data.yTo) };
    this.source = data.source ? new Source(data.source) : null;
    this.logarithmic = this.kind === "spectrum";
    this.chart = null;
  }

  async start() {
    const first = await this.load(this.whole.from, this.whole.to);
    this.draw(first, this.whole);
    for (const button of this.figure.querySelectorAll("[data-act]")) {
      button.addEventListener("click", () => this.act(button));
    }
    dark.addEventListener("change", () => this.redraw());
  }

  load(from, to) {
    if (this.kind === "histogram") return this.source.histogram();
    return this.source.window(from, to, 2 * (this.figure.clientWidth || 700), this.logarithmic);
  }

  draw(points, shown) {
    this.chart?.destroy();
    this.figure.classList.add("live");
    const live = this.figure.querySelector(".plot-live");
    live.hidden = false;
    this.figure.querySelector(".plot-tools").hidden = false;
    Chart.defaults.locale = document.documentElement.lang;
    this.chart = new Chart(live.querySelector("canvas"), this.config(points, shown));
  }

  redraw() {
    const { x } = this.chart.scales;
    this.draw(this.chart.data.datasets[0].data, { from: x.min, to: x.max });
  }

  async act(button) {
    const { x } = this.chart.scales;
    let [from, to] = this.logarithmic ? [Math.log(x.min), Math.log(x.max)] : [x.min, x.max];
    const wide = to - from;
    switch (button.dataset.act) {
      case "closer":
        [from, to] = [from + wide / 4, to - wide / 4];
        break;
      case "wider":
        [from, to] = [from - wide / 2, to + wide / 2];
        break;
      case "back":
        [from, to] = [from - wide / 2, to - wide / 2];
        break;
      case "on":
        [from, to] = [from + wide / 2, to + wide / 2];
        break;
      case "scale":
        this.logarithmic = !this.logarithmic;
        button.setAttribute("aria-pressed", String(!this.logarithmic));
        return this.show(this.whole.from, this.whole.to, true);
      default:
        return this.show(this.whole.from, this.whole.to, false);
    }
    return this.logarithmic
      ? this.show(Math.exp(from), Math.exp(to), false)
      : this.show(from, to, false);
  }

  /** Shows a window with as fine points as it needs. */
  async show(from, to, anew) {
    const left = Math.max(this.whole.from, from);
    const right = Math.min(this.whole.to, to);
    if (!(left < right)) return;
    const points = await this.load(left, right);
    if (points === null) return;
    if (anew) {
      this.draw(points, { from: left, to: right });
      return;
    }
    const { chart } = this;
    chart.data.datasets[0].data = points;
    chart.options.scales.x.min = left;
    chart.options.scales.x.max = right;
    chart.update("none");
  }

  config(points, shown) {
    const look = theme();
    const plugins = [
      { id: "own", beforeInit: (chart) => Object.assign(chart, { $theme: look, $marks: this.marks }) },
      limits,
      flags,
    ];
    return {
      type: this.kind === "histogram" ? "bar" : "line",
      data: { datasets: this.datasets(points, look) },
      options: {
        animation: false,
        responsive: true,
        maintainAspectRatio: false,
        parsing: false,
        normalized: true,
        layout: { padding: { top: this.marks.flags?.length ? flagRoom : 6, right: 8 } },
        interaction: { mode: "nearest", axis: "x", intersect: false },
        scales: { x: this.xScale(shown, look), y: this.scale("y", this.height, look, true) },
        plugins: {
          legend: { display: false },
          tooltip: { callbacks: { title: (items) => this.place(items[0].parsed.x) } },
          zoom: this.zoom(),
        },
      },
      plugins,
    };
  }

  datasets(points, look) {
    const bars = this.kind === "histogram";
    return [
      {
        label: this.titles.y,
        data: points,
        borderColor: look.accent,
        backgroundColor: bars ? look.accent : "transparent",
        borderWidth: bars ? 0 : 1.1,
        pointRadius: 0,
        barPercentage: 1,
        categoryPercentage: 1,
        grouped: false,
      },
    ];
  }

  xScale(shown, look) {
    const scale = this.scale("x", shown, look, false);
    scale.type = this.logarithmic ? "logarithmic" : "linear";
    if (this.logarithmic) {
      // taken out before room is shared out, or numbers that are not shown would push shown ones aside
      scale.afterBuildTicks = (drawn) => {
        drawn.ticks = drawn.ticks.filter(({ value }) => {
          const digit = value / Math.pow(10, Math.floor(Math.log10(value) + 1e-9));
          return [1, 2, 5].includes(Math.round(digit * 1e6) / 1e6);
        });
      };
      scale.ticks.callback = (value) => value.toLocaleString(Chart.defaults.locale);
    }
    return scale;
  }

  scale(axis, range, look, grid) {
    return {
      type: "linear",
      min: range.from,
      max: range.to,
      title: { display: true, text: this.titles[axis], color: look.faint, font: { family: look.font } },
      ticks: { color: look.faint, font: { family: look.font }, maxRotation: 0, includeBounds: false, format: { useGrouping: false }, autoSkipPadding: 14 },
      grid: { display: grid, color: look.rule },
      border: { color: look.faint },
    };
  }

  place(x) {
    return `${this.titles.x}: ${x.toLocaleString(Chart.defaults.locale, { maximumFractionDigits: 4 })}`;
  }

  zoom() {
    const able = !fingers && (this.kind === "trace" || this.kind === "spectrum");
    const finer = ({ chart }) => this.show(chart.scales.x.min, chart.scales.x.max, false);
    return {
      limits: { x: { min: this.whole.from, max: this.whole.to } },
      pan: { enabled: able, mode: "x", modifierKey: "shift", onPanComplete: finer },
      zoom: {
        mode: "x",
        drag: { enabled: able },
        wheel: { enabled: able, modifierKey: "ctrl" },
        onZoomComplete: finer,
      },
    };
  }
}

for (const figure of document.querySelectorAll("[data-plot]")) {
  // where a curve cannot be fetched the drawing stays
  new Plot(figure).start().catch((e) => console.warn("chart stays as drawn", e));
}
