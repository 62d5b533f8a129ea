import { CustomChart, LineChart } from 'echarts/charts';
import { GridComponent, TooltipComponent } from 'echarts/components';
import * as echarts from 'echarts/core';
import { SVGRenderer } from 'echarts/renderers';
import ReactEChartsModule from 'echarts-for-react/lib/core';

echarts.use([LineChart, CustomChart, GridComponent, TooltipComponent, SVGRenderer]);

/** The package is CommonJS: some bundlers hand over its namespace in place of its default. */
const holder: { default?: typeof ReactEChartsModule } = ReactEChartsModule as object;
export const ReactECharts = holder.default ?? ReactEChartsModule;

export { echarts };
