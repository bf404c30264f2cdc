import { dueBoard } from '@/lib/server/queries/due-board';
import { recentChanges } from '@/lib/server/queries/recent-changes';
import type { OtherSiteCase } from '@/tests/support/other-site';
import { BoardPlant, daysBefore } from '../due-board/board-plant';

export const cases: OtherSiteCase[] = [
  {
    name: 'dueBoard',
    expects: 'empty',
    run: async (foreigner, plant, em) => {
      const book = await BoardPlant.at(em, plant.home.siteId, plant.at('engineer').personId);
      const visit = { at: new Date(), value: 3, oneX: 2.9, lagDeg: 40, speedRpm: 990 };
      await book.read(plant.home.pointIds[0], visit);
      const home = await dueBoard(plant.at('reader'), undefined);
      if (home.cards.length === 0) throw new Error('the home site has no card to hide');
      const { cards, unranked } = await dueBoard(foreigner, undefined);
      const isHome = ({ machineId }: { machineId: number }) => machineId === plant.home.machineId;
      return [...cards.filter(isHome), ...unranked.filter(isHome)];
    },
  },
  {
    name: 'recentChanges',
    expects: 'empty',
    run: async (foreigner, plant, em) => {
      const book = await BoardPlant.at(em, plant.home.siteId, plant.at('engineer').personId);
      const [first] = plant.home.pointIds;
      const visit = { oneX: null, lagDeg: null, speedRpm: 990 };
      await book.read(first, { ...visit, value: 1, at: daysBefore(new Date(), 12) });
      await book.read(first, { ...visit, value: 3, at: daysBefore(new Date(), 11) });
      await book.balanced(plant.home.machineId, daysBefore(new Date(), 10));
      const home = await recentChanges(plant.at('reader'), undefined);
      if (home.worse.length + home.events.length < 2) throw new Error('nothing to hide at home');
      const { worse, better, events } = await recentChanges(foreigner, undefined);
      return [...worse, ...better, ...events];
    },
  },
];
