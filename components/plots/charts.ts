/** The one place where the chart library is put together: what is drawn here, and nothing else of it. */
import { CustomChart, LineChart, ScatterChart } from 'echarts/charts';
import { GridComponent, MarkLineComponent, TooltipComponent } from 'echarts/components';
import * as charts from 'echarts/core';
import { CanvasRenderer } from 'echarts/renderers';

charts.use([
  CanvasRenderer,
  CustomChart,
  GridComponent,
  LineChart,
  MarkLineComponent,
  ScatterChart,
  TooltipComponent,
]);

export { charts };
