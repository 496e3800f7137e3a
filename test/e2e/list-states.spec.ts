import { gridStates, listStates, testListStates } from '../support/list-states'

testListStates([...listStates, ...gridStates])
