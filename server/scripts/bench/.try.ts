import { BENCH_DENSITY_KG_M3, benchCycle, benchFleet, loadedFleet, bareLoop } from './core-fleet';
import { rankByEnergy, variantEnergies, energyComparables, loadedVehicle } from '#shared/core/ranking/energy-ranking';
import { energiesOnCycle } from '#shared/core/road-load/energies-on-cycle';
import { inseparableGroups, neighbourProbabilities } from '#shared/core/ranking/comparables';
import { ascending } from '#shared/core/ranking/drag-ranking';
const fleet = benchFleet(1000); const cond = { cycle: benchCycle(), airDensityKgM3: BENCH_DENSITY_KG_M3 };
const veh=loadedFleet(fleet); const bare=bareLoop(cond.cycle,veh);
const en = variantEnergies(fleet,cond); const sorted = ascending(en,r=>r.wheelEnergyJ,r=>r.variantId);
const map=new Map(fleet.map(({variant,zeroYaw})=>[variant.id,zeroYaw])); const set=energyComparables(sorted,map);
const g=inseparableGroups(set,.95); console.log('groups',g.length, g.reduce((s,x)=>s+x.length,0)/g.length);
const T:Record<string,()=>unknown>={ bare, loaded:()=>fleet.map(c=>loadedVehicle(c,1.189)), energiesOnCycle:()=>energiesOnCycle(cond.cycle,veh,1.189), variantEnergies:()=>variantEnergies(fleet,cond), ascending:()=>ascending(en,r=>r.wheelEnergyJ,r=>r.variantId), comparables:()=>energyComparables(sorted,map), groups:()=>inseparableGroups(set,.95), neighbours:()=>neighbourProbabilities(set), rank:()=>rankByEnergy(fleet,cond,.95)};
for(const [k,f] of Object.entries(T)){for(let i=0;i<10;i++)f();const t:number[]=[];for(let i=0;i<31;i++){const s=performance.now();f();t.push(performance.now()-s);}t.sort((a,b)=>a-b);console.log(k,'median',t[15]!.toFixed(2),'min',t[0]!.toFixed(2));}
