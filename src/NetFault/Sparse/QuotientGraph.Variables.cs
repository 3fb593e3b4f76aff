namespace NetFault.Sparse;

/// <summary>The steps that rewrite the variables next to a pivot.</summary>
internal unsafe ref partial struct QuotientGraph
{
    /// <summary>
    /// Rewrites the list of each variable i of the pivot's element: absorbed elements and variables reached through the pivot go, the
    /// pivot comes in. degree[i] becomes the paper's bound less |L_p \ i|, which <see cref="RestoreDegreeLists"/> adds.
    /// </summary>
    private void UpdateDegrees(int pivot)
    {
        for (int p = start[pivot], end = p + length[pivot]; p < end; p++)
        {
            int i = list[p];
            long sum = 0;
            int outside = 0;
            int elementsEnd = KeepElements(i, ref outside, ref sum);
            int kept = KeepVariables(i, elementsEnd, ref outside, ref sum);
            if (kept == start[i])
            {
                EliminateWith(pivot, i);
                continue;
            }

            // There is room: i came into L_p through the pivot or an absorbed element, which its list has lost.
            list[kept] = list[elementsEnd];
            list[elementsEnd] = pivot;
            elementCount[i] = elementsEnd + 1 - start[i];
            length[i] = kept + 1 - start[i];
            degree[i] = Math.Min(degree[i], outside);
            PutInBucket(i, sum);
        }
    }

    private readonly int KeepElements(int i, ref int outside, ref long sum)
    {
        int kept = start[i];
        for (int q = kept, end = kept + elementCount[i]; q < end; q++)
        {
            int element = list[q];
            int beyond = mark[element] - stamp;
            if (beyond > 0)
            {
                outside += beyond;
                sum += element;
                list[kept++] = element;
            }
            else
            {
                mark[element] = Dead; // aggressive absorption: L_e lies wholly in L_p
            }
        }

        return kept;
    }

    private readonly int KeepVariables(int i, int kept, ref int outside, ref long sum)
    {
        for (int q = start[i] + elementCount[i], end = start[i] + length[i]; q < end; q++)
        {
            int j = list[q], nodesIn = size[j];
            if (nodesIn > 0)
            {
                outside += nodesIn;
                sum += j;
                list[kept++] = j;
            }
        }

        return kept;
    }

    /// <summary>Mass elimination: i touches nothing but the pivot's element, so it can follow the pivot without further fill.</summary>
    private void EliminateWith(int pivot, int i)
    {
        int nodesIn = -size[i];
        degree[pivot] -= nodesIn;
        eliminated += nodesIn;
        Append(pivot, i);
    }

    private readonly void Append(int name, int merged)
    {
        size[merged] = 0;
        nextMember[lastMember[name]] = merged;
        lastMember[name] = lastMember[merged];
    }

    private readonly void PutInBucket(int i, long sum)
    {
        int h = (int)(sum % nodes);
        hash[i] = h;
        nextInBucket[i] = bucket[h];
        bucket[h] = i;
    }

    /// <summary>Variables of the pivot's element with the same list will fill in alike: they become one supervariable.</summary>
    private void MergeIndistinguishable(int pivot)
    {
        stamp += nodes + 1; // above every mark that MeasureElementsOutside left
        for (int p = start[pivot], end = p + length[pivot]; p < end; p++)
        {
            int i = list[p];
            if (size[i] == 0)
            {
                continue;
            }

            int candidate = bucket[hash[i]];
            bucket[hash[i]] = None;
            for (; candidate != None && nextInBucket[candidate] != None; candidate = nextInBucket[candidate])
            {
                MergeLaterInBucket(candidate);
            }
        }
    }

    private void MergeLaterInBucket(int i)
    {
        StampList(i);
        int previous = i;
        for (int j = nextInBucket[i]; j != None; j = nextInBucket[j])
        {
            if (HasStampedList(i, j))
            {
                size[i] += size[j];
                Append(i, j);
                nextInBucket[previous] = nextInBucket[j];
            }
            else
            {
                previous = j;
            }
        }

        stamp++;
    }

    private readonly void StampList(int i)
    {
        for (int q = start[i], end = q + length[i]; q < end; q++)
        {
            mark[list[q]] = stamp;
        }
    }

    private readonly bool HasStampedList(int i, int j)
    {
        if (length[i] != length[j] || elementCount[i] != elementCount[j])
        {
            return false;
        }

        for (int q = start[j], end = q + length[j]; q < end; q++)
        {
            if (mark[list[q]] != stamp)
            {
                return false;
            }
        }

        return true;
    }
}
