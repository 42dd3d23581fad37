// Draws one trend: the spread of each bucket as a band, its mean as a line, limits as labelled lines. Gaps stay gaps.
import ApexCharts from "../../lib/apexcharts.esm.js";

const charts = new WeakMap();
const fields = 4;

function colour(name) {
  return getComputedStyle(document.documentElement).getPropertyValue(name).trim();
}

function seriesOf(spec) {
  const band = [];
  const line = [];
  const p = spec.points;
  for (let i = 0; i < p.length; i += fields) {
    const time = p[i];
    if (i > 0 && time - p[i - fields] > spec.gapMs) {
      const middle = (time + p[i - fields]) / 2;
      band.push({ x: middle, y: [null, null] });
      line.push({ x: middle, y: null });
    }
    band.push({ x: time, y: [p[i + 1], p[i + 3]] });
    line.push({ x: time, y: p[i + 2] });
  }
  return [
    { type: "rangeArea", name: "lowest to highest", data: band },
    { type: "line", name: "mean", data: line }
  ];
}

function optionsOf(spec) {
  const text = colour("--text-soft");
  return {
    chart: {
      type: "rangeArea", height: 240, animations: { enabled: false }, toolbar: { show: false }, zoom: { enabled: false },
      fontFamily: "inherit", foreColor: text, background: "transparent"
    },
    series: seriesOf(spec),
    colors: [colour("--band"), colour("--ink")],
    fill: { opacity: [0.35, 1] },
    stroke: { width: [0, 2], curve: "straight" },
    dataLabels: { enabled: false },
    legend: { show: false },
    markers: { size: 0, hover: { size: 4 } },
    grid: { borderColor: colour("--line") },
    xaxis: {
      type: "datetime", min: spec.from, max: spec.to, tooltip: { enabled: false },
      labels: { datetimeUTC: true, datetimeFormatter: { hour: "HH:mm", day: "d MMM" } }
    },
    yaxis: { min: spec.low, max: spec.high, tickAmount: 4, labels: { formatter: v => (v === null || v === undefined ? "" : v.toFixed(spec.digits)) } },
    tooltip: {
      shared: true, intersect: false, theme: matchMedia("(prefers-color-scheme: dark)").matches ? "dark" : "light", x: { format: "d MMM HH:mm" },
      y: { formatter: v => (v === null || v === undefined ? "" : v.toFixed(spec.digits) + (spec.unit ? " " + spec.unit : "")) }
    },
    annotations: {
      yaxis: spec.limits.map(l => ({
        y: l.value, borderColor: colour(l.isUrgent ? "--urgent" : "--warning"), strokeDashArray: l.isUrgent ? 0 : 5, borderWidth: 1.5,
        label: { text: l.text, position: "left", textAnchor: "start", borderWidth: 0, style: { color: colour("--text"), background: colour("--paper") } }
      }))
    }
  };
}

export function draw(element, spec) {
  const known = charts.get(element);
  if (known) {
    known.updateOptions(optionsOf(spec), false, false, false);
    return;
  }
  const chart = new ApexCharts(element, optionsOf(spec));
  charts.set(element, chart);
  chart.render();
}

export function remove(element) {
  charts.get(element)?.destroy();
  charts.delete(element);
}
