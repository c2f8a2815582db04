export { type ChartOrder, chartScene, drawChart, type DrawnChart } from './chartFor';
export { chartForEvent, type EventChartRequest } from './chartForEvent';
