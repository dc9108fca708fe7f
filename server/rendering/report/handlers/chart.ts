import { chartHeight } from '#shared/report/charts/chart-height.ts';
import { chartSentence } from '#shared/report/charts/chart-sentence.ts';
import { comparisonChart } from '#shared/report/charts/comparison-chart.ts';
import type { ChartNode } from '#shared/report/schema/report-node.ts';
import { drawChart } from '../../charts/draw-chart.ts';
import { drawCaption, layOutCaption } from '../caption.ts';
import { noticeBlock } from '../notice.ts';
import { POINTS_PER_PIXEL, PRINT_THEME } from '../print-style.ts';
import type { BlockHandler } from '../render-context.ts';

const SPACE_ABOVE = 12;
const SPACE_BELOW = 10;
const CAPTION_GAP = 5;

/** A chart as vectors, full width, with its caption; both stand on one page. */
export const chart: BlockHandler<ChartNode> = (node, context) => {
  const { writer, flow, left, width, evidence, findings } = context;
  const number = context.numbers.figures.get(node.attrs.anchor) ?? 0;
  const row = evidence.charts.find((one) => one.id === node.attrs.chart);
  const finding = findings.charts.get(node.attrs.chart);
  if (!row || !finding || finding.fault) {
    const why = finding?.fault?.sentence ?? 'Its comparison is no longer in the evidence.';
    noticeBlock(`Figure ${number} cannot be drawn. ${why}`, context);
    return;
  }
  const sentence = chartSentence(row, finding);
  const caption = layOutCaption(`Figure ${number}`, node.attrs.caption || sentence, width);
  const size = { width: width / POINTS_PER_PIXEL, height: chartHeight(width / POINTS_PER_PIXEL) };
  const height = size.height * POINTS_PER_PIXEL;
  flow.begin(SPACE_ABOVE, height + CAPTION_GAP + caption.height);
  const top = flow.y;
  const figure = writer.element('Figure', {
    alt: sentence,
    placement: 'Block',
    bbox: [left, top, left + width, top + height],
  });
  context.element.add(figure);
  writer.content(figure, 'Figure', () => {
    const configuration = comparisonChart(finding, evidence, evidence.settings, PRINT_THEME, size);
    drawChart(writer, configuration, size, { x: left, y: top, scale: POINTS_PER_PIXEL });
  });
  drawCaption(caption.lines, figure, top + height + CAPTION_GAP, context);
  flow.y = top + height + CAPTION_GAP + caption.height + SPACE_BELOW;
};
