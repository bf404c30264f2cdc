import { dueBoard } from '@/lib/server/queries/due-board';
import type { OtherSiteCase } from '@/tests/support/other-site';
import { BoardPlant } from '../due-board/board-plant';

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
];
