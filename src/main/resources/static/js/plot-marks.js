// What is written into a chart besides its curve: limits, names of lines, bars of uncertainty.

const FLAG_ROW = 15;
export const FLAG_ROWS = 3;

function inside(chart, draw) {
  const { ctx, chartArea: area } = chart;
  ctx.save();
  ctx.font = `11px ${chart.$theme.font}`;
  draw(ctx, area);
  ctx.restore();
}

/** Level lines with their names. */
export const limits = {
  id: "limits",
  afterDatasetsDraw(chart) {
    const found = chart.$marks.limits ?? [];
    const y = chart.scales.y;
    inside(chart, (ctx, area) => {
      ctx.strokeStyle = chart.$theme.signal;
      ctx.fillStyle = chart.$theme.signal;
      ctx.textAlign = "right";
      for (const limit of found) {
        if (limit.value < y.min || limit.value > y.max) continue;
        const level = y.getPixelForValue(limit.value);
        ctx.setLineDash([10, 4]);
        ctx.lineWidth = 1.3;
        ctx.beginPath();
        ctx.moveTo(area.left, level);
        ctx.lineTo(area.right, level);
        ctx.stroke();
        const foot = level < area.top + 16 ? level + 13 : level - 4;
        ctx.setLineDash([]);
        const wide = ctx.measureText(limit.name).width;
        ctx.fillStyle = chart.$theme.sheet;
        ctx.fillRect(area.right - 7 - wide, foot - 11, wide + 6, 14);
        ctx.fillStyle = chart.$theme.signal;
        ctx.fillText(limit.name, area.right - 4, foot);
      }
    });
  },
};

/** Names of lines above the chart, each in the first row where it runs into no other. */
export const flags = {
  id: "flags",
  afterDatasetsDraw(chart) {
    const { x, y } = chart.scales;
    const seen = (chart.$marks.flags ?? [])
      .filter((flag) => flag.x >= x.min && flag.x <= x.max)
      .sort((a, b) => a.x - b.x);
    const taken = new Array(FLAG_ROWS).fill(-Infinity);
    inside(chart, (ctx, area) => {
      ctx.strokeStyle = chart.$theme.faint;
      ctx.fillStyle = chart.$theme.ink;
      ctx.lineWidth = 0.7;
      for (const flag of seen) {
        const at = x.getPixelForValue(flag.x);
        const wide = ctx.measureText(flag.word).width;
        const begin = Math.max(area.left, Math.min(at + 3, area.right - wide));
        let row = 0;
        while (row < FLAG_ROWS - 1 && taken[row] > begin) row++;
        if (taken[row] > begin) continue;
        taken[row] = begin + wide + 8;
        const level = area.top - FLAG_ROWS * FLAG_ROW + 11 + row * FLAG_ROW;
        ctx.beginPath();
        ctx.moveTo(at, level - 8);
        ctx.lineTo(at, y.getPixelForValue(Math.min(flag.y, y.max)));
        ctx.stroke();
        ctx.fillText(flag.word, begin, level);
      }
    });
  },
};

export const flagRoom = FLAG_ROW * FLAG_ROWS;
