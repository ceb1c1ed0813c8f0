import { expose } from 'comlink';
import { openPartList } from '#workers/part-list/open-part-list.ts';

expose(openPartList());
