import { commitTask, previewTask } from './imports/import-tasks.ts';
import { runTasks } from './platform/tasks/run-tasks.ts';

/** Entry of the thread for long work: the tasks of every feature, by the names that they are asked for. */
runTasks({ 'imports.preview': previewTask, 'imports.commit': commitTask });
