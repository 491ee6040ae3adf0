import { Chart, Filler, Legend, LinearScale, LineElement, PointElement, ScatterController, Tooltip } from 'chart.js';

// The parts that the house style uses, and no others: the rest stays out of the bundles.
Chart.register(ScatterController, LineElement, PointElement, LinearScale, Filler, Legend, Tooltip);

export { Chart };
