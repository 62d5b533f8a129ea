import { Download } from 'lucide-react';
import { fileNameOf, tableToCsv } from '../../charts/chart-table';
import { saveFile } from '../../charts/save-file';
import { letterOfRun } from '../../runs/run-title';
import { IconButton } from '../../ui/icon-button';
import { Menu, MenuItem } from '../../ui/menu';
import { modelJson, modelTable, type ModelFileInput } from './model-file';

/** The model that is shown, as a file. */
export function ModelSaveMenu(props: ModelFileInput) {
  const { soundingName, earth, run } = props;
  const name = fileNameOf(`${soundingName} ${run ? `run ${letterOfRun(run)}` : 'model by hand'}`);
  const saveCsv = () => {
    const text = tableToCsv(modelTable(earth, run?.result ?? null));
    saveFile(`${name}.csv`, new Blob(['\ufeff', text], { type: 'text/csv;charset=utf-8' }));
  };
  const saveJson = () => saveFile(`${name}.json`, new Blob([modelJson(props)], { type: 'application/json' }));
  return (
    <Menu trigger={<IconButton label="Save the model" icon={<Download aria-hidden size={16} />} />}>
      <MenuItem onSelect={saveCsv}>Beds (CSV)</MenuItem>
      <MenuItem onSelect={saveJson}>Beds, settings and readings (JSON)</MenuItem>
    </Menu>
  );
}
